import { parseArgs } from 'node:util';
import { openDatabase } from '../db/client';
import { issueApiToken } from '../services/accounts';
import { resolveDatabaseUrl } from './databaseUrl';

const usage =
  'Usage: npm run token -- --email someone@lab.example [--group "…"] [--name "…"] [--days 90]';

/** Prints a new token for scripts on the last line, and nothing after it. */
async function main(): Promise<void> {
  const { values } = parseArgs({
    options: {
      email: { type: 'string' },
      group: { type: 'string' },
      name: { type: 'string', default: 'made on the command line' },
      days: { type: 'string', default: '90' },
    },
  });
  const days = Number(values.days);
  if (!values.email || !Number.isInteger(days) || days < 1 || days > 366) throw new Error(usage);
  const { db, close } = openDatabase(resolveDatabaseUrl(process.env));
  try {
    const { email, group, name } = values;
    console.log(await issueApiToken(db, { email, group, name, days }, new Date()));
  } finally {
    await close();
  }
}

await main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : String(error));
  process.exitCode = 1;
});

import { parseArgs } from 'node:util';
import { openDatabase } from '../db/client';
import { addAdmin } from '../services/accounts';
import { resolveDatabaseUrl } from './databaseUrl';

const usage = 'Usage: npm run admin -- --email someone@lab.example --name "…" --group "…"';

/** Makes the first admin of a group, and prints the password once. */
async function main(): Promise<void> {
  const { values } = parseArgs({
    options: { email: { type: 'string' }, name: { type: 'string' }, group: { type: 'string' } },
  });
  const { email, name, group } = values;
  if (!email?.includes('@') || !name || !group) throw new Error(usage);
  const { db, close } = openDatabase(resolveDatabaseUrl(process.env));
  try {
    const password = await addAdmin(db, { email, name, group }, new Date());
    console.log(`${email} is admin of ${group}. The password, shown only now:\n${password}`);
  } finally {
    await close();
  }
}

await main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : String(error));
  process.exitCode = 1;
});

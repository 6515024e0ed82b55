import { openServices } from '../services/runtime';
import { seedDemo } from '../services/seedDemo';
import { resolveDatabaseUrl } from './databaseUrl';

/** Puts the demo groups into the database the first time; later runs leave everything as it is. */
async function main(): Promise<void> {
  const url = resolveDatabaseUrl(process.env);
  const { services, close } = openServices({ ...process.env, DATABASE_URL: url });
  try {
    if (await seedDemo(services)) console.log('The demo groups are in place.');
  } finally {
    await close();
  }
}

await main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : String(error));
  process.exitCode = 1;
});

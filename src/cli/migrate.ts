import { fileURLToPath } from 'node:url';
import { migrateDatabase } from '../db/migrate';
import { resolveDatabaseUrl } from './databaseUrl';

const folder = fileURLToPath(new URL('../../drizzle', import.meta.url));

try {
  await migrateDatabase(resolveDatabaseUrl(process.env), folder);
} catch (error) {
  const reason = error instanceof Error ? (error.cause ?? error) : error;
  console.error(
    `The database could not be migrated: ${reason instanceof Error ? reason.message : String(reason)}.`,
  );
  process.exitCode = 1;
}

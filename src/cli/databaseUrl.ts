import { readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { z } from 'zod/v4';

/** What the launcher writes when its own database is up; `url` carries the password. */
const databaseFile = z.object({ url: z.url() });

/**
 * The address of the database: `DATABASE_URL`, or else the embedded one of `RATEWELL_HOME`.
 *
 * @throws Error that says what to do when neither is there
 */
export function resolveDatabaseUrl(env: NodeJS.ProcessEnv): string {
  if (env.DATABASE_URL) return env.DATABASE_URL;
  const path = join(resolve(env.RATEWELL_HOME || '.data'), 'database.json');
  try {
    return databaseFile.parse(JSON.parse(readFileSync(path, 'utf8'))).url;
  } catch (error) {
    throw new Error(
      `No database is running: ${path} is missing or unreadable. Start Ratewell with npm start, or set DATABASE_URL.`,
      { cause: error },
    );
  }
}

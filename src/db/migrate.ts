import { drizzle } from 'drizzle-orm/mysql2';
import { migrate } from 'drizzle-orm/mysql2/migrator';
import { createConnection } from 'mysql2/promise';

/**
 * Brings the database up to the newest migration. Two servers that start at once take turns, since
 * MariaDB cannot roll a table change back.
 *
 * @throws Error when another migration holds the lock for more than a minute, or when one fails.
 */
export async function migrateDatabase(url: string, folder: string): Promise<void> {
  const connection = await createConnection({ uri: url, timezone: 'Z' });
  try {
    const [rows] = await connection.query(
      "SELECT GET_LOCK(CONCAT('ratewell-migrate-', DATABASE()), 60) AS held",
    );
    if ((rows as { held: number }[])[0]?.held !== 1) {
      throw new Error(
        'Another migration of this database is running; try again when it has ended.',
      );
    }
    await migrate(drizzle(connection), { migrationsFolder: folder });
  } finally {
    await connection.end();
  }
}

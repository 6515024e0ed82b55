import { drizzle, type MySql2Database } from 'drizzle-orm/mysql2';
import { createPool, type Pool, type PoolOptions } from 'mysql2/promise';
import * as schema from './schema';

export type Database = MySql2Database<typeof schema>;
/** A database or a transaction on it; repositories take either. */
export type Executor = Pick<Database, 'select' | 'insert' | 'update' | 'delete' | 'execute'>;

export interface DatabaseHandle {
  db: Database;
  close: () => Promise<void>;
}

/** Pool options for a mysql:// address; instants travel as UTC. */
export function poolOptions(url: string): PoolOptions {
  return {
    uri: url,
    timezone: 'Z',
    connectionLimit: 10,
    charset: 'utf8mb4',
    supportBigNumbers: true,
  };
}

/** Opens a pool on `url`; nothing is connected before the first query. */
export function openDatabase(url: string): DatabaseHandle {
  const pool: Pool = createPool(poolOptions(url));
  const db = drizzle(pool, { schema, mode: 'default', casing: 'snake_case' });
  return { db, close: () => pool.end() };
}

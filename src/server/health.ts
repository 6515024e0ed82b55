import type { ServerResponse } from 'node:http';
import { createPool } from 'mysql2/promise';

export interface DatabaseProbe {
  /** Resolves when the database answers. */
  ping(): Promise<void>;
  close(): Promise<void>;
}

const pingMs = 2_000;

/** Asks the database over a connection of its own, so that a busy pool does not look like a death. */
export function openProbe(url: string): DatabaseProbe {
  const pool = createPool({ uri: url, connectionLimit: 1, connectTimeout: pingMs });
  return {
    async ping() {
      await pool.query({ sql: 'SELECT 1', timeout: pingMs });
    },
    close: () => pool.end(),
  };
}

/** 200 when the server can do its work, 503 when the database does not answer. */
export async function answerHealth(response: ServerResponse, probe: DatabaseProbe): Promise<void> {
  const ok = await probe.ping().then(
    () => true,
    () => false,
  );
  response.writeHead(ok ? 200 : 503, {
    'content-type': 'application/json',
    'cache-control': 'no-store',
    ...(ok ? {} : { 'retry-after': '5' }),
  });
  response.end(JSON.stringify({ status: ok ? 'ok' : 'database-away' }));
}

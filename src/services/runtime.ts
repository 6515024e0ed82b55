import { randomUUID } from 'node:crypto';
import { openDatabase } from '../db/client';
import { AnalysisRunner } from './analysisRunner';
import type { Services } from './services';
import { openWorkerPools } from './workerPools';

let services: Services | null = null;

/**
 * The services of this server, opened at the first call from its environment. Analyses that an
 * earlier server left unfinished are taken up then.
 */
export function getServices(): Services {
  if (!services) {
    services = openServices(process.env).services;
    services.runner.resume().catch(() => {
      console.error('Unfinished analyses could not be taken up: the database did not answer.');
    });
  }
  return services;
}

/** Opens services on `DATABASE_URL` and the workers of `RATEWELL_WORKERS`. */
export function openServices(env: NodeJS.ProcessEnv): {
  services: Services;
  close: () => Promise<void>;
} {
  const url = env.DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL is not set: start the server with npm start.');
  const database = openDatabase(url);
  const pools = openWorkerPools(env.RATEWELL_WORKERS ?? 'dist/workers');
  const now = () => new Date();
  const runner = new AnalysisRunner(database.db, pools, now);
  return {
    services: { db: database.db, pools, now, newId: randomUUID, runner },
    async close() {
      await pools.close();
      await database.close();
    },
  };
}

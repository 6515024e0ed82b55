import { randomUUID } from 'node:crypto';
import { openDatabase } from '../db/client';
import { AnalysisRunner } from './analysisRunner';
import type { Services } from './services';
import { openWorkerPools } from './workerPools';

let services: Services | null = null;

/** The services of this server, opened at the first call from its environment. */
export function getServices(): Services {
  services ??= openServices(process.env);
  return services;
}

/** Opens services on `DATABASE_URL` and the workers of `RATEWELL_WORKERS`. */
export function openServices(env: NodeJS.ProcessEnv): Services {
  const url = env.DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL is not set: start the server with npm start.');
  const { db } = openDatabase(url);
  const pools = openWorkerPools(env.RATEWELL_WORKERS ?? 'dist/workers');
  const now = () => new Date();
  return { db, pools, now, newId: randomUUID, runner: new AnalysisRunner(db, pools, now) };
}

import type { Database } from '../db/client';
import type { AnalysisRunner } from './analysisRunner';
import type { WorkerPools } from './workerPools';

/** What the use cases work with. Time and identities come from here, so that tests can set them. */
export interface Services {
  db: Database;
  pools: WorkerPools;
  runner: AnalysisRunner;
  now: () => Date;
  newId: () => string;
}

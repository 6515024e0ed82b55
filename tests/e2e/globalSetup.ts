import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { startServer } from '../../src/cli/appServer.mjs';
import { ensureBuilt } from '../../src/cli/build.mjs';
import { stopAll } from '../../src/cli/lifecycle.mjs';
import { freePort } from '../../src/cli/ports.mjs';
import { runCommand } from '../../src/cli/prepare.mjs';
import { root } from '../../src/cli/settings.mjs';
import { makeEmptyDatabase } from '../fixtures/testDatabase';

/** Serves the build on a free port, with the demo freshly in a database of its own. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const databaseUrl = await makeEmptyDatabase('_e2e');
  const home = mkdtempSync(join(tmpdir(), 'ratewell-e2e-'));
  const build = join(root, 'dist');
  await ensureBuilt(build, join(home, 'build.log'));
  const port = await freePort();
  const baseUrl = `http://127.0.0.1:${port}`;
  const env = {
    PATH: process.env.PATH,
    HOME: process.env.HOME,
    PORT: String(port),
    HOST: '127.0.0.1',
    APP_URL: baseUrl,
    RATEWELL_HOME: home,
    RATEWELL_WORKERS: join(build, 'workers'),
    AUTH_SECRET: 'signs the cookies of the end-to-end tests only',
    DATABASE_URL: databaseUrl,
  };
  await runCommand('seed', env);
  await startServer({ build, home, url: baseUrl, env });
  project.provide('baseUrl', baseUrl);
  project.provide('databaseUrl', databaseUrl);
  return async () => {
    await stopAll();
    rmSync(home, { recursive: true, force: true });
  };
}

import { join } from 'node:path';
import { stopLeftServer } from './appServer.mjs';
import { startDatabase } from './database.mjs';
import { claimHome } from './homeLock.mjs';
import { onStop } from './lifecycle.mjs';
import { nodeVersionFault } from './nodeVersion.mjs';
import { ensurePackages } from './packages.mjs';
import { requireFreePort } from './ports.mjs';
import { run } from './processes.mjs';
import { keptSecret, makePrivateFolder, readSettings, root } from './settings.mjs';
import { Stop } from './say.mjs';

/** @throws Stop when this Node.js is too old */
export function requireNode() {
  const fault = nodeVersionFault(process.versions.node);
  if (fault) throw new Stop(fault);
}

/** Runs one of our TypeScript commands. @throws Stop with what it said when it fails */
export async function runCommand(name, env) {
  const tsx = join(root, 'node_modules/tsx/dist/cli.mjs');
  const script = join(root, 'src/cli', `${name}.ts`);
  const { code, output } = await run(process.execPath, [tsx, script], { cwd: root, env });
  if (code !== 0) throw new Stop(output.trim() || `${name} failed with exit code ${code}.`);
  return output;
}

/**
 * Everything that comes before serving: packages, the database, its migrations.
 *
 * @returns settings and the environment that the server and our commands run with
 */
export async function prepare() {
  requireNode();
  const settings = readSettings(process.env);
  const { home } = settings;
  makePrivateFolder(home);
  makePrivateFolder(join(home, 'logs'));
  onStop(claimHome(home));
  await stopLeftServer(home);
  await requireFreePort(settings.host, settings.port);
  await ensurePackages(home);
  const env = {
    ...process.env,
    PORT: String(settings.port),
    HOST: settings.host,
    APP_URL: settings.appUrl,
    RATEWELL_HOME: home,
    AUTH_SECRET: process.env.AUTH_SECRET || keptSecret(home, 'auth-secret'),
    DATABASE_URL: process.env.DATABASE_URL || (await startDatabase({ home })),
  };
  await runCommand('migrate', env).catch((error) => {
    throw process.env.DATABASE_URL ? new Stop(`${error.message} Check DATABASE_URL.`) : error;
  });
  return { settings, env };
}

/** Puts in the demo where it is wanted and not there yet. */
export async function seedDemo(settings, env, build) {
  if (!settings.demo) return;
  const workers = join(build, 'workers');
  await runCommand('seed', { ...env, RATEWELL_WORKERS: workers });
}

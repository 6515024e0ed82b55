import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { buildWorkers } from './build.mjs';
import { isStopping, onStop, stopAll, stopOnSignals } from './lifecycle.mjs';
import { prepare, seedDemo } from './prepare.mjs';
import { stopChild } from './processes.mjs';
import { root } from './settings.mjs';
import { sayWhy } from './say.mjs';

/** `npm run dev`: the database, migrated and with the demo, and Astro's development server on it. */
async function develop() {
  const { settings, env } = await prepare();
  const build = join(settings.home, 'dev');
  await buildWorkers(build);
  await seedDemo(settings, env, build);
  const astro = join(root, 'node_modules/astro/astro.js');
  const place = ['--host', settings.host, '--port', String(settings.port)];
  const child = spawn(process.execPath, [astro, 'dev', ...place], {
    cwd: root,
    env: { ...env, RATEWELL_WORKERS: join(build, 'workers'), ASTRO_TELEMETRY_DISABLED: '1' },
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  onStop(() => stopChild(child, 5_000));
  const code = await new Promise((resolve) => child.once('exit', resolve));
  if (isStopping()) return;
  await stopAll();
  process.exit(code ?? 1);
}

stopOnSignals();
await develop().catch(async (error) => {
  if (isStopping()) return;
  sayWhy(error);
  await stopAll();
  process.exit(1);
});

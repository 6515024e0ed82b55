import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { buildWorkers } from './build.mjs';
import { ensurePackages } from './packages.mjs';
import { run } from './processes.mjs';
import { readSettings, root } from './settings.mjs';
import { sayWhy } from './say.mjs';

/**
 * `npm run bench`: bundles the benchmark as the workers are bundled, and runs it. Its ratios are of
 * one run, each against a reference on the same work.
 */
async function bench() {
  const { home } = readSettings({ RATEWELL_HOME: process.env.RATEWELL_HOME });
  const folder = join(home, 'bench');
  mkdirSync(folder, { recursive: true });
  await ensurePackages(home);
  const { build } = await import('esbuild');
  await build({
    entryPoints: ['bench', 'freshProcess'].map((name) => join(root, 'src/cli/bench', `${name}.ts`)),
    outdir: folder,
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    logLevel: 'error',
    packages: 'external',
    absWorkingDir: root,
  });
  await buildWorkers(folder);
  const { code } = await run(process.execPath, [join(folder, 'bench.mjs'), folder, root], {
    cwd: root,
    env: { ...process.env, NODE_ENV: 'production' },
    show: true,
  });
  rmSync(folder, { recursive: true, force: true });
  process.exitCode = code ?? 1;
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  await bench().catch((error) => {
    sayWhy(error);
    process.exitCode = 1;
  });
}

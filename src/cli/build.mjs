import { readdirSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { run } from './processes.mjs';
import { root } from './settings.mjs';
import { say, sayWhy, Stop } from './say.mjs';
import { hashSources, isBuiltFrom, markBuilt } from './sources.mjs';

/** Code that was written for CommonJS asks for `require`, which a module has to be given. */
const banner =
  "import { createRequire as _createRequire } from 'node:module'; const require = _createRequire(import.meta.url);";

const options = {
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  outExtension: { '.js': '.mjs' },
  logLevel: 'silent',
  absWorkingDir: root,
};

/** Bundles each src/workers/*.worker.ts into `folder`/workers, with the packages it uses. */
export async function buildWorkers(folder) {
  const { build } = await import('esbuild');
  const source = join(root, 'src/workers');
  const entries = readdirSync(source).filter((name) => name.endsWith('.worker.ts'));
  await build({
    ...options,
    entryPoints: entries.map((name) => join(source, name)),
    outdir: join(folder, 'workers'),
    // The pool has to recognise what its own `move` has marked.
    external: ['piscina'],
    banner: { js: banner },
  });
}

async function buildServer(folder) {
  const { build } = await import('esbuild');
  await build({
    ...options,
    entryPoints: { 'server-main': join(root, 'src/server/main.ts') },
    outdir: folder,
    packages: 'external',
  });
}

/** Builds pages, workers and the server into `folder`. @throws Stop with what was wrong */
export async function buildAll(folder, log) {
  const hash = hashSources(root);
  rmSync(folder, { recursive: true, force: true });
  const astro = join(root, 'node_modules/astro/astro.js');
  const { code, output } = await run(process.execPath, [astro, 'build', '--outDir', folder], {
    cwd: root,
    env: { ...process.env, NODE_ENV: 'production', ASTRO_TELEMETRY_DISABLED: '1', NO_COLOR: '1' },
    log,
  });
  if (code !== 0) throw new Stop(`The build failed; its last words:\n${tail(output)}`);
  try {
    await Promise.all([buildWorkers(folder), buildServer(folder)]);
  } catch (error) {
    throw new Stop(`The build failed: ${error.message}`);
  }
  markBuilt(folder, hash);
}

const tail = (output) => output.trimEnd().split('\n').slice(-25).join('\n');

/** Builds where the sources are not those of the last build. */
export async function ensureBuilt(folder, log) {
  if (isBuiltFrom(folder, hashSources(root))) return;
  say('Building (half a minute) …');
  await buildAll(folder, log);
}

/** `npm run build`, and `npm run build:workers` with the argument "workers". */
async function main() {
  const folder = resolve(root, process.env.RATEWELL_DIST || 'dist');
  if (process.argv[2] === 'workers') await buildWorkers(folder);
  else await buildAll(folder);
  say(`Built into ${folder}`);
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  await main().catch((error) => {
    sayWhy(error);
    process.exitCode = 1;
  });
}

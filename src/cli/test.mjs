import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { provideChromium } from './chromium.mjs';
import { startDatabase } from './database.mjs';
import { claimHome } from './homeLock.mjs';
import { isStopping, onStop, stopAll, stopOnSignals } from './lifecycle.mjs';
import { ensurePackages } from './packages.mjs';
import { requireNode } from './prepare.mjs';
import { run } from './processes.mjs';
import { makePrivateFolder, readSettings, root } from './settings.mjs';
import { say, sayWhy, Stop } from './say.mjs';
import { countTests } from './testCount.mjs';

const suites = ['check', 'unit', 'integration', 'e2e'];

/** A log is read without them. */
const colours = process.stdout.isTTY ? { FORCE_COLOR: '1' } : { NO_COLOR: '1' };

const checks = [
  ['format', 'prettier/bin/prettier.cjs', ['--check', '--log-level=warn', '.']],
  ['lint', 'eslint/bin/eslint.js', ['.', '--max-warnings=0']],
  ['types', 'astro/astro.js', ['check', '--minimumFailingSeverity=hint']],
];

/**
 * `npm test`: everything from nothing, or the named suites only. It has a database of its own, which
 * is emptied; one that `DATABASE_URL` names is not touched.
 */
async function test(names) {
  const unknown = names.find((name) => !suites.includes(name));
  if (unknown) throw new Stop(`There is no suite "${unknown}": ${suites.join(', ')}.`);
  const wanted = new Set(names.length > 0 ? names : suites);
  requireNode();
  const shared = readSettings({ RATEWELL_HOME: process.env.RATEWELL_HOME }).home;
  const home = join(shared, 'test');
  makePrivateFolder(shared);
  makePrivateFolder(home);
  makePrivateFolder(join(home, 'logs'));
  onStop(claimHome(home));
  await ensurePackages(home);

  const counts = { passed: 0, failed: 0 };
  const add = ({ passed, failed }) => {
    counts.passed += passed;
    counts.failed += failed;
  };
  if (wanted.has('check')) add(await runChecks());
  const projects = suites.filter((name) => name !== 'check' && wanted.has(name));
  if (projects.length > 0) add(await runProjects(projects, await provide(projects, home, shared)));
  return counts;
}

/** What the suites need beside the packages, as environment variables. */
async function provide(projects, home, shared) {
  const env = { TEST_HOME: home };
  if (projects.includes('e2e'))
    Object.assign(env, await provideChromium(shared, process.env).catch(tellStop));
  if (projects.some((name) => name !== 'unit')) {
    env.TEST_DATABASE_URL =
      process.env.TEST_DATABASE_URL ||
      (await startDatabase({ home, serverHome: shared })).replace(/\/ratewell$/, '/ratewell_test');
  }
  return env;
}

/** What fails for want of it says so itself; the rest is worth running. */
function tellStop(error) {
  if (!(error instanceof Stop)) throw error;
  sayWhy(error);
  return {};
}

async function runChecks() {
  const counts = { passed: 0, failed: 0 };
  for (const [name, program, args] of checks) {
    const { code, output } = await run(
      process.execPath,
      [join(root, 'node_modules', program), ...args],
      { cwd: root, env: { ...process.env, ...colours, ASTRO_TELEMETRY_DISABLED: '1' } },
    );
    const passed = code === 0;
    say(`${passed ? 'passed' : 'FAILED'}  ${name}`);
    if (!passed) say(output.trimEnd());
    counts[passed ? 'passed' : 'failed'] += 1;
  }
  return counts;
}

async function runProjects(projects, env) {
  const report = join(env.TEST_HOME, 'report.json');
  rmSync(report, { force: true });
  const vitest = join(root, 'node_modules/vitest/vitest.mjs');
  const { code } = await run(
    process.execPath,
    [
      vitest,
      'run',
      ...projects.map((name) => `--project=${name}`),
      '--reporter=default',
      '--reporter=json',
      `--outputFile=${report}`,
    ],
    { cwd: root, env: { ...process.env, ...colours, ...env }, show: true },
  );
  let told = null;
  try {
    told = JSON.parse(readFileSync(report, 'utf8'));
  } catch {
    say('The test runner ended without a report.');
  }
  return countTests(told, code);
}

stopOnSignals(130);
try {
  const { passed, failed } = await test(process.argv.slice(2));
  await stopAll();
  say(`${passed} passed, ${failed} failed`);
  process.exitCode = failed === 0 && passed > 0 ? 0 : 1;
} catch (error) {
  if (!isStopping()) {
    sayWhy(error);
    await stopAll();
    say('0 passed, 1 failed');
    process.exit(1);
  }
}

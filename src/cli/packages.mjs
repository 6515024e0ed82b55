import { accessSync, constants, readFileSync } from 'node:fs';
import { homedir } from 'node:os';
import { join } from 'node:path';
import { lastReason, run } from './processes.mjs';
import { root } from './settings.mjs';
import { say, Stop } from './say.mjs';

/**
 * True when what npm says it installed is what the lock file asks for. Packages for other platforms
 * may be missing.
 *
 * @param lock the parsed package-lock.json
 * @param installed the parsed node_modules/.package-lock.json; npm writes it when it has finished
 */
export function packagesMatch(lock, installed) {
  return Object.entries(lock.packages).every(([path, wanted]) => {
    if (path === '' || wanted.link) return true;
    const found = installed.packages[path];
    if (!found) return Boolean(wanted.optional || wanted.devOptional);
    return found.version === wanted.version && found.integrity === wanted.integrity;
  });
}

const readJson = (path) => JSON.parse(readFileSync(path, 'utf8'));

function areInstalled() {
  try {
    return packagesMatch(
      readJson(join(root, 'package-lock.json')),
      readJson(join(root, 'node_modules/.package-lock.json')),
    );
  } catch {
    return false;
  }
}

/** Installs the packages of the lock file where they are missing or others. @throws Stop */
export async function ensurePackages(home) {
  if (areInstalled()) return;
  say('Installing packages (a minute or two) …');
  const npm = process.env.npm_execpath?.endsWith('.js')
    ? [process.execPath, process.env.npm_execpath]
    : ['npm'];
  const [command, ...args] = [...npm, 'ci', '--include=dev', '--no-audit', '--no-fund'];
  const log = join(home, 'logs/packages.log');
  const { code, output } = await run(command, args, { cwd: root, env: npmEnvironment(home), log });
  if (code === 127) {
    throw new Stop('npm was not found. Install Node.js 20 with npm, and start again.');
  }
  if (code !== 0) {
    throw new Stop(
      `The packages could not be installed: ${npmReason(output)} Check the connection to the npm registry and start again; all of npm's words are in ${log}.`,
    );
  }
}

/** npm keeps its cache in the home folder; where that cannot be written, in ours. */
function npmEnvironment(home) {
  // "production" would leave out what builds and checks.
  const env = { ...process.env };
  delete env.NODE_ENV;
  if (env.npm_config_cache && isWritable(env.npm_config_cache)) return env;
  return isWritable(homedir()) ? env : { ...env, npm_config_cache: join(home, 'npm-cache') };
}

function isWritable(path) {
  try {
    accessSync(path, constants.W_OK);
    return true;
  } catch {
    return false;
  }
}

function npmReason(output) {
  const lines = output.split('\n').filter((line) => /^npm (error|ERR!)/.test(line));
  const told = lines.map((line) => line.replace(/^npm (error|ERR!) /, ''));
  const reason = told.find((line) => !/^(code|syscall|errno|path|A complete log)/.test(line));
  return `${(reason ?? lastReason(output)).replace(/\.$/, '')}.`;
}

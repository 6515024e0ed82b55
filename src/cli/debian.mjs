import { existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { lastReason, run } from './processes.mjs';

const environment = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C' };

/** What a command needs before it to run as root: nothing, sudo, or null where it cannot. */
async function rootPrefix() {
  if (process.getuid?.() === 0) return [];
  return (await run('sudo', ['-n', 'true'])).code === 0 ? ['sudo', '-n', '-E'] : null;
}

/**
 * Installs Debian packages for the whole machine, where this user may.
 *
 * @returns null when they are installed, else why not
 */
export async function installPackages(names, log) {
  const prefix = await rootPrefix();
  if (!prefix) return 'this user is not root and has no sudo without a password';
  const apt = (...args) => {
    const [command, ...rest] = [...prefix, 'apt-get', '-o', 'DPkg::Lock::Timeout=120', ...args];
    return run(command, rest, { env: environment, log });
  };
  // One source of many that fails is no reason not to try the rest.
  await apt('-q', 'update');
  const { code, output } = await apt('-q', '-y', '--no-install-recommends', 'install', ...names);
  return code === 0 ? null : lastReason(output);
}

/**
 * Downloads a Debian package with what it needs and this machine lacks, and unpacks all of it under
 * `folder`. Takes no rights; apt keeps its lists and downloads inside `folder` as well.
 *
 * @returns null when it is there, else why not
 */
export async function unpackPackage(name, folder, log) {
  const work = join(folder, '.apt');
  mkdirSync(join(work, 'state/lists/partial'), { recursive: true });
  mkdirSync(join(work, 'cache/archives/partial'), { recursive: true });
  const options = [
    `Dir::State=${work}/state`,
    'Dir::State::status=/var/lib/dpkg/status',
    `Dir::State::extended_states=${work}/state/extended_states`,
    `Dir::Cache=${work}/cache`,
    `Dir::Log=${work}`,
    'Debug::NoLocking=1',
    'APT::Sandbox::User=',
  ].flatMap((option) => ['-o', option]);
  const apt = (...args) => run('apt-get', [...options, '-q', ...args], { env: environment, log });
  try {
    await apt('update');
    const fetched = await apt(
      ...['-y', '--download-only', '--reinstall', '--no-install-recommends', 'install', name],
    );
    if (fetched.code !== 0) return lastReason(fetched.output);
    const archives = join(work, 'cache/archives');
    for (const file of readdirSync(archives).filter((entry) => entry.endsWith('.deb'))) {
      const unpacked = await run('dpkg-deb', ['-x', join(archives, file), folder], { log });
      if (unpacked.code !== 0) return lastReason(unpacked.output);
    }
    return null;
  } finally {
    rmSync(work, { recursive: true, force: true });
  }
}

/** What a program that was unpacked under `folder` is run with, to find the libraries beside it. */
export function unpackedEnvironment(folder) {
  const triplet = { x64: 'x86_64-linux-gnu', arm64: 'aarch64-linux-gnu' }[process.arch] ?? '';
  const paths = ['usr/lib', 'lib'].flatMap((lib) => [
    ...withSubfolders(join(folder, lib, triplet)),
    join(folder, lib),
  ]);
  const inherited = process.env.LD_LIBRARY_PATH;
  return { LD_LIBRARY_PATH: [...paths, ...(inherited ? [inherited] : [])].join(delimiter) };
}

/** Some packages keep libraries one folder deeper, which programs know by the system's path only. */
function withSubfolders(path) {
  if (!existsSync(path)) return [];
  const folders = readdirSync(path, { withFileTypes: true }).filter((one) => one.isDirectory());
  const holding = folders
    .map(({ name }) => join(path, name))
    .filter((deeper) => readdirSync(deeper).some((name) => /^lib.*\.so/.test(name)));
  return [path, ...holding];
}

import { accessSync, constants, existsSync, realpathSync, renameSync, rmSync } from 'node:fs';
import { delimiter, dirname, join } from 'node:path';
import { installPackages, unpackedEnvironment, unpackPackage } from './debian.mjs';
import { run } from './processes.mjs';
import { say, Stop } from './say.mjs';

/** Debian's server without the system service: nothing is started that nobody asked for. */
const packageName = 'mariadb-server-core';
/** JSON_TABLE and SKIP LOCKED came with this one. */
const oldestVersion = [10, 6];

/**
 * The MariaDB server program: the machine's, or one installed or unpacked now.
 *
 * @returns program, shareFolder (messages, character sets and SQL of the system tables), version,
 *   env to run it with
 * @throws Stop that says what to install when there is none to be had
 */
export async function provideMariadb(home, env) {
  const ownFolder = join(home, 'mariadb');
  const found = (await findSystem(env)) ?? (await describe(ownProgram(ownFolder), ownFolder));
  if (found) return found;

  const reasons = [];
  if (env.RATEWELL_MARIADBD !== 'none') {
    say('Installing MariaDB (Debian package mariadb-server-core) …');
    const fault = await installPackages([packageName], join(home, 'logs/mariadb-install.log'));
    const installed = await findSystem(env);
    if (installed) return installed;
    reasons.push(fault ?? 'the package holds no mariadbd');
  }
  say(`Unpacking MariaDB into ${ownFolder} …`);
  const draft = `${ownFolder}.new`;
  rmSync(draft, { recursive: true, force: true });
  const fault = await unpackPackage(packageName, draft, join(home, 'logs/mariadb-unpack.log'));
  if (!fault) {
    rmSync(ownFolder, { recursive: true, force: true });
    renameSync(draft, ownFolder);
    const unpacked = await describe(ownProgram(ownFolder), ownFolder);
    if (unpacked) return unpacked;
  }
  rmSync(draft, { recursive: true, force: true });
  reasons.push(fault ?? 'the unpacked server does not run');
  throw new Stop(
    `No MariaDB server could be had (${reasons.join('; ')}). Install it with: sudo apt-get install ${packageName} — or set DATABASE_URL to a MariaDB of your own.`,
  );
}

const ownProgram = (folder) => join(folder, 'usr/sbin/mariadbd');

/** `RATEWELL_MARIADBD` names the program, or is "none" to do without the machine's. */
async function findSystem(env) {
  const named = env.RATEWELL_MARIADBD;
  if (named === 'none') return null;
  if (named) {
    const server = await describe(named);
    if (!server) throw new Stop(`RATEWELL_MARIADBD is ${named}, which is no MariaDB server.`);
    return server;
  }
  const folders = ['/usr/sbin', '/usr/local/sbin', '/usr/libexec', '/usr/local/libexec'];
  for (const folder of [...folders, ...(env.PATH ?? '').split(delimiter).filter(Boolean)]) {
    const server = await describe(join(folder, 'mariadbd'));
    if (server) return server;
  }
  return null;
}

/** What there is to know of a server program; null when it is missing, too old or does not run. */
async function describe(program, unpackedIn) {
  try {
    accessSync(program, constants.X_OK);
  } catch {
    return null;
  }
  const env = unpackedIn ? { ...process.env, ...unpackedEnvironment(unpackedIn) } : process.env;
  const { code, output } = await run(program, ['--no-defaults', '--version'], { env });
  const [version, ...parts] = /(\d+)\.(\d+)\.\d+/.exec(output) ?? [];
  if (code !== 0 || !version || !isRecent(parts.map(Number))) return null;
  const baseFolder = dirname(dirname(realpathSync(program)));
  const shareFolder = [join(baseFolder, 'share/mysql'), join(baseFolder, 'share/mariadb')].find(
    (folder) => existsSync(join(folder, 'english/errmsg.sys')),
  );
  return shareFolder ? { program, shareFolder, version, env } : null;
}

const isRecent = ([major, minor]) =>
  major > oldestVersion[0] || (major === oldestVersion[0] && minor >= oldestVersion[1]);

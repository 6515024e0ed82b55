import { accessSync, constants, existsSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { installPackages, unpackedEnvironment, unpackPackage } from './debian.mjs';
import { run } from './processes.mjs';
import { say, Stop } from './say.mjs';

const packageName = 'chromium';

/**
 * The browser of the end-to-end tests: the machine's, or Debian's installed or unpacked now.
 *
 * @param home folder that an unpacked browser is looked for, and put, in
 * @returns the environment that tells the tests where it is
 * @throws Stop that says what to install when there is none to be had
 */
export async function provideChromium(home, env) {
  const ownFolder = join(home, packageName);
  const found = await findChromium(env, ownFolder);
  if (found) return found;

  say('Installing Chromium (Debian package chromium) …');
  const log = (name) => join(home, 'logs', name);
  const notInstalled = await installPackages([packageName], log('chromium-install.log'));
  const installed = await findChromium(env, ownFolder);
  if (installed) return installed;

  say(`Unpacking Chromium into ${ownFolder} …`);
  const draft = `${ownFolder}.new`;
  rmSync(draft, { recursive: true, force: true });
  const notUnpacked = await unpackPackage(packageName, draft, log('chromium-unpack.log'));
  if (!notUnpacked) {
    rmSync(ownFolder, { recursive: true, force: true });
    renameSync(draft, ownFolder);
    const unpacked = await findChromium(env, ownFolder);
    if (unpacked) return unpacked;
  }
  rmSync(draft, { recursive: true, force: true });
  const reasons = [notInstalled, notUnpacked ?? 'the unpacked browser does not run'];
  throw new Stop(
    `No Chromium could be had (${reasons.filter(Boolean).join('; ')}). Install it with: sudo apt-get install ${packageName} — or set CHROMIUM to the path of one.`,
  );
}

async function findChromium(env, ownFolder) {
  const named = env.CHROMIUM ? [env.CHROMIUM] : [];
  for (const program of [...named, '/usr/bin/chromium', '/usr/bin/chromium-browser']) {
    if (await runs(program, {})) return { CHROMIUM: program };
  }
  // The script in usr/bin looks for the program in the system's folders.
  const program = join(ownFolder, 'usr/lib/chromium/chromium');
  const libraries = unpackedEnvironment(ownFolder);
  if (!(await runs(program, libraries))) return null;
  const fonts = join(ownFolder, 'etc/fonts');
  return {
    CHROMIUM: program,
    CHROMIUM_LIBRARIES: libraries.LD_LIBRARY_PATH,
    ...(existsSync('/etc/fonts') ? {} : { FONTCONFIG_PATH: fonts }),
  };
}

async function runs(program, libraries) {
  try {
    accessSync(program, constants.X_OK);
  } catch {
    return false;
  }
  const env = { ...process.env, ...libraries };
  return (await run(program, ['--version'], { env })).code === 0;
}

import { chmodSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { randomBytes } from 'node:crypto';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Stop } from './say.mjs';

/** The checkout. */
export const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..');

const wildcards = new Set(['0.0.0.0', '::', '[::]']);

/** Where the server listens and what it calls itself, from the environment. */
export function readSettings(env) {
  const port = Number(env.PORT || 4321);
  if (!Number.isInteger(port) || port < 1 || port > 65535) {
    throw new Stop(`PORT must be a whole number from 1 to 65535, got ${env.PORT}.`);
  }
  const host = env.HOST || '127.0.0.1';
  const bareHost = host.replace(/^\[(.*)\]$/, '$1');
  const reachable = wildcards.has(host) ? '127.0.0.1' : bareHost;
  const authority = `${reachable.includes(':') ? `[${reachable}]` : reachable}:${port}`;
  return {
    port,
    host: bareHost,
    /** Where this machine itself reaches the server. */
    localUrl: `http://${authority}`,
    appUrl: env.APP_URL || `http://${authority}`,
    home: resolve(root, env.RATEWELL_HOME || '.data'),
    demo: env.DEMO !== '0',
  };
}

/** Makes a folder that only its owner may read. */
export function makePrivateFolder(path) {
  mkdirSync(path, { recursive: true, mode: 0o700 });
  chmodSync(path, 0o700);
}

/** The secret kept under `name` in `home`; made at the first call, and readable by its owner only. */
export function keptSecret(home, name) {
  const path = join(home, name);
  try {
    writeFileSync(path, randomBytes(32).toString('base64url'), { flag: 'wx', mode: 0o600 });
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
  }
  const secret = readFileSync(path, 'utf8').trim();
  if (secret.length < 32) {
    throw new Stop(`${path} holds no usable secret. Remove the file; a new one is then made.`);
  }
  return secret;
}

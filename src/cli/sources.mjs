import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** What a build is made of; `src/cli` only calls it. */
const parts = ['src', 'public', 'astro.config.mjs', 'tsconfig.json', 'package-lock.json'];
const apart = (path) => path.startsWith('src/cli/') && path !== 'src/cli/build.mjs';

/** SHA-256 over the names and the bytes of everything that a build in `root` is made of. */
export function hashSources(root) {
  const hash = createHash('sha256');
  for (const path of parts.flatMap((part) => filesUnder(root, part)).filter((one) => !apart(one))) {
    const bytes = readFileSync(join(root, path));
    hash.update(`${path}\0${bytes.length}\0`).update(bytes);
  }
  return hash.digest('hex');
}

function filesUnder(root, part) {
  let entries;
  try {
    entries = readdirSync(join(root, part), { recursive: true, withFileTypes: true });
  } catch (error) {
    if (error.code === 'ENOTDIR') return [part];
    if (error.code === 'ENOENT') return [];
    throw error;
  }
  return entries
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name).slice(root.length + 1))
    .sort();
}

const stampIn = (folder) => join(folder, '.sources');

/** True when `folder` holds a finished build of exactly these sources. */
export function isBuiltFrom(folder, hash) {
  try {
    return readFileSync(stampIn(folder), 'utf8') === hash;
  } catch {
    return false;
  }
}

/** Marks the build in `folder` as finished; the last thing that a build does. */
export function markBuilt(folder, hash) {
  writeFileSync(stampIn(folder), hash);
}

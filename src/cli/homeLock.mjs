import { linkSync, readFileSync, rmSync, unlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { startOf } from './processes.mjs';
import { Stop } from './say.mjs';

/**
 * Claims `home` for this launcher until it ends.
 *
 * @returns a function that gives it back
 * @throws Stop when another launcher that is alive holds it
 */
export function claimHome(home) {
  const path = join(home, 'launcher.json');
  const draft = join(home, `launcher.${process.pid}.json`);
  const claim = { pid: process.pid, startedAt: startOf(process.pid) };
  writeFileSync(draft, JSON.stringify(claim), { mode: 0o600 });
  try {
    dropStale(path);
    // A hard link is made by one of two racers only.
    linkSync(draft, path);
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
    throw new Stop(busy(home, readClaim(path)?.pid));
  } finally {
    unlinkSync(draft);
  }
  return () => {
    if (readClaim(path)?.pid === process.pid) rmSync(path, { force: true });
  };
}

const busy = (home, pid) =>
  `Ratewell runs from ${home} already (process ${pid ?? 'unknown'}). Stop it, or set another RATEWELL_HOME and PORT.`;

function dropStale(path) {
  const claim = readClaim(path);
  // A process number is given again after a while: only the same beginning is the same process.
  const held = claim !== null && startOf(claim.pid) === claim.startedAt;
  if (!held) rmSync(path, { force: true });
}

function readClaim(path) {
  try {
    const claim = JSON.parse(readFileSync(path, 'utf8'));
    return typeof claim?.pid === 'number' && typeof claim.startedAt === 'number' ? claim : null;
  } catch {
    return null;
  }
}

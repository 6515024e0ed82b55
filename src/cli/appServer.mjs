import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { isStopping, onStop } from './lifecycle.mjs';
import { processesWith, stopChild, stopProcess } from './processes.mjs';
import { root } from './settings.mjs';
import { say, Stop } from './say.mjs';

/** The server itself takes leave within ten seconds. */
const closingMs = 12_000;
const openingMs = 60_000;

/** Marks a server with the folder that it works for, so that a later start finds it. */
const markOf = (home) => `--home=${home}`;

/** A server whose launcher was killed is on its way out: wait for it, and hurry it. */
export async function stopLeftServer(home) {
  for (const pid of processesWith(markOf(home))) {
    say('Stopping the server that an earlier start left running …');
    await stopProcess(pid, closingMs);
  }
}

/**
 * Starts the built server, registers its stop, and waits until it answers.
 *
 * @param options `build`: folder of the build; `url`: where this machine reaches the server
 * @returns a promise of its end: `ended` resolves with the exit code
 * @throws Stop when it ends, or does not answer
 */
export async function startServer({ build, home, url, env }) {
  const child = spawn(process.execPath, [join(build, 'server-main.mjs'), markOf(home)], {
    cwd: root,
    env: { ...env, NODE_ENV: 'production', RATEWELL_WORKERS: join(build, 'workers') },
    // A group of its own: Ctrl-C reaches the launcher alone. The channel tells the server when the
    // launcher is gone, however that came about.
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  onStop(() => stopChild(child, closingMs));
  const ended = new Promise((resolve) => child.once('exit', (code) => resolve(code ?? 1)));
  let gone = false;
  void ended.then(() => {
    gone = true;
  });
  const until = Date.now() + openingMs;
  while (!gone && Date.now() < until) {
    if (await isHealthy(url)) return { ended };
    await wait(100);
  }
  if (isStopping()) await new Promise(() => undefined);
  // When it ended, it said why itself.
  throw new Stop(
    gone ? 'Ratewell was not started.' : `The server did not answer at ${url} within a minute.`,
  );
}

async function isHealthy(url) {
  try {
    const answer = await fetch(new URL('/healthz', url), { signal: AbortSignal.timeout(3_000) });
    await answer.arrayBuffer();
    return answer.status === 200;
  } catch {
    return false;
  }
}

import { say } from './say.mjs';

const closers = [];
let ending = null;

/** Registers what has to be stopped at the end; the newest is stopped first. */
export function onStop(close) {
  closers.push(close);
  return () => {
    const place = closers.indexOf(close);
    if (place >= 0) closers.splice(place, 1);
  };
}

export const isStopping = () => ending !== null;

/** Stops everything registered, one after the other, and waits for each. */
export function stopAll() {
  ending ??= (async () => {
    for (let close = closers.pop(); close; close = closers.pop()) {
      await Promise.resolve(close()).catch(() => undefined);
    }
  })();
  return ending;
}

/** Ctrl-C, a service manager's stop and a closed terminal end the launcher in good order. */
export function stopOnSignals(exitCode = 0) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      if (isStopping()) return;
      if (signal !== 'SIGHUP') say('\nStopping …');
      void stopAll().then(() => process.exit(exitCode));
    });
  }
  // A terminal that is gone must not keep the database from being stopped.
  process.stdout.on('error', () => undefined);
  process.stderr.on('error', () => undefined);
}

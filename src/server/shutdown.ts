import type { Server } from 'node:http';
import type { EventStreams } from './eventStreams';
import type { DatabaseProbe } from './health';

/** What is still being answered gets this long. */
const patienceMs = 9_000;

/**
 * Ends the server in good order on a signal, or when the launcher that started it is gone: takes
 * nothing new, says goodbye to event streams, lets answers finish, and exits with 0.
 */
export function stopOnSignals(server: Server, streams: EventStreams, probe: DatabaseProbe): void {
  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    const exit = () => {
      void probe.close().catch(() => undefined);
      process.exit(0);
    };
    server.close(exit);
    streams.sayBye();
    server.closeIdleConnections();
    setTimeout(exit, patienceMs).unref();
  };
  for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP'] as const) process.on(signal, stop);
  if (process.send) process.once('disconnect', stop);
}

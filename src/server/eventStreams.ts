import type { ServerResponse } from 'node:http';

/** The event streams that are open, so that a stopping server can take leave of them. */
export class EventStreams {
  readonly #open = new Set<ServerResponse>();

  /** Keeps an eye on an answer; it counts once it turns out to be an event stream. */
  watch(response: ServerResponse): void {
    this.#open.add(response);
    response.once('close', () => this.#open.delete(response));
  }

  /** Tells every stream that the server goes; a client then asks again later. */
  sayBye(): void {
    for (const response of this.#open) {
      const type = String(response.getHeader('content-type') ?? '');
      if (!response.headersSent || !type.startsWith('text/event-stream')) continue;
      response.end('event: bye\ndata: {}\n\n');
    }
  }
}

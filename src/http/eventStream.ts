const keepAliveMs = 15_000;

/** Sends each value as one server-sent event, and a comment now and then to keep the line open. */
export function eventStream(event: string, values: AsyncIterable<unknown>): Response {
  const encoder = new TextEncoder();
  const iterator = values[Symbol.asyncIterator]();
  let timer: NodeJS.Timeout | undefined;
  const stream = new ReadableStream<Uint8Array>({
    start(controller) {
      timer = setInterval(() => {
        controller.enqueue(encoder.encode(': still here\n\n'));
      }, keepAliveMs);
    },
    async pull(controller) {
      const step = await iterator.next();
      if (step.done) {
        clearInterval(timer);
        controller.close();
        return;
      }
      controller.enqueue(
        encoder.encode(`event: ${event}\ndata: ${JSON.stringify(step.value)}\n\n`),
      );
    },
    async cancel() {
      clearInterval(timer);
      await iterator.return?.();
    },
  });
  return new Response(stream, {
    headers: {
      'content-type': 'text/event-stream',
      'cache-control': 'no-store',
      'x-accel-buffering': 'no',
    },
  });
}

const heartbeatMs = 15_000;

/**
 * Server-Sent Events: one event of the given name for each value, until the values end or the client leaves, of which
 * the signal tells. A comment now and then keeps proxies from closing a quiet connection.
 */
export function answerEvents(
  name: string,
  requestSignal: AbortSignal,
  follow: (signal: AbortSignal) => AsyncGenerator<unknown>,
): Response {
  const encoder = new TextEncoder();
  const leaving = new AbortController();
  const values = follow(AbortSignal.any([requestSignal, leaving.signal]));
  let heartbeat: NodeJS.Timeout;
  const body = new ReadableStream<Uint8Array>({
    start(controller) {
      heartbeat = setInterval(() => controller.enqueue(encoder.encode(": still here\n\n")), heartbeatMs);
    },
    async pull(controller) {
      const next = await values.next().catch((error: unknown) => {
        clearInterval(heartbeat);
        throw error;
      });
      if (!next.done) {
        controller.enqueue(encoder.encode(`event: ${name}\ndata: ${JSON.stringify(next.value)}\n\n`));
        return;
      }
      clearInterval(heartbeat);
      // A stream that was cancelled is closed already.
      if (!leaving.signal.aborted) controller.close();
    },
    async cancel() {
      clearInterval(heartbeat);
      leaving.abort();
      await values.return(undefined);
    },
  });
  return new Response(body, {
    headers: {
      "Content-Type": "text/event-stream",
      "Cache-Control": "no-cache, no-transform",
      "X-Accel-Buffering": "no",
    },
  });
}

const heartbeatMs = 15_000;

/**
 * Server-Sent Events: one event of the given name for each value, until the values end or the client leaves. A comment
 * now and then keeps proxies from closing a quiet connection.
 */
export function answerEvents(name: string, values: AsyncGenerator<unknown>, signal: AbortSignal): Response {
  const encoder = new TextEncoder();
  let heartbeat: NodeJS.Timeout;
  const body = new ReadableStream<Uint8Array>({
    start(controller) {
      heartbeat = setInterval(() => controller.enqueue(encoder.encode(": still here\n\n")), heartbeatMs);
      signal.addEventListener("abort", () => clearInterval(heartbeat), { once: true });
    },
    async pull(controller) {
      const next = await values.next();
      if (next.done) {
        clearInterval(heartbeat);
        if (!signal.aborted) controller.close();
        return;
      }
      controller.enqueue(encoder.encode(`event: ${name}\ndata: ${JSON.stringify(next.value)}\n\n`));
    },
    async cancel() {
      clearInterval(heartbeat);
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

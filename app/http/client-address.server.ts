/** Set by the server on every request, over whatever the client sent. */
export const clientAddressHeader = "x-backsight-client-address";

/** The network address that throttles count by; null where no server has set it. */
export function clientAddressOf(request: Request): string | null {
  return request.headers.get(clientAddressHeader);
}

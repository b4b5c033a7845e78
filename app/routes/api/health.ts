/** Liveness: the process answers. */
export function loader() {
  return Response.json({ status: "ok" }, { headers: { "Cache-Control": "no-store" } });
}

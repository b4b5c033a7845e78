import { checkReadiness } from "@/app/http/readiness.server";

/** Readiness: 503 with the names of what cannot be reached. */
export async function loader() {
  const readiness = await checkReadiness();
  const isReady = Object.values(readiness).every(Boolean);
  return Response.json(
    { status: isReady ? "ready" : "notReady", ...readiness },
    { status: isReady ? 200 : 503, headers: { "Cache-Control": "no-store" } },
  );
}

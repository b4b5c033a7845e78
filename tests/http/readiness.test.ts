import { describe, expect, it } from "vitest";
import { loader as health } from "@/app/routes/api/health";
import { action as unknownPost, loader as unknownGet } from "@/app/routes/api/not-found";
import { loader as ready } from "@/app/routes/api/ready";
import { useDatabase } from "../support/database";

useDatabase();

describe("the state of the process", () => {
  it("is alive whatever it can reach", async () => {
    expect(await health().json()).toEqual({ status: "ok" });
  });

  it("names each service that it needs, and is ready only when all can be reached", async () => {
    const response = await ready();
    const { status, ...services } = (await response.json()) as Record<string, unknown>;
    expect(Object.keys(services).sort()).toEqual(["database", "queue", "storage"]);
    const isReady = Object.values(services).every((reached) => reached === true);
    expect([response.status, status]).toEqual(isReady ? [200, "ready"] : [503, "notReady"]);
    expect(services.database).toBe(true);
    expect(response.headers.get("Cache-Control")).toBe("no-store");
  });
});

describe("an address that the API does not have", () => {
  it.each([unknownGet, unknownPost])("is a problem with status 404 for every method", async (run) => {
    const response = run({ request: new Request("http://127.0.0.1:3000/api/v1/nothing") });
    expect(response.status).toBe(404);
    expect(response.headers.get("Content-Type")).toBe("application/problem+json");
    expect(await response.json()).toMatchObject({ detail: expect.stringContaining("/api/v1/nothing") });
  });
});

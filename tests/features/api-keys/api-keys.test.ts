import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { ensureAccount } from "@/app/features/accounts/ensure-account.server";
import { loadAccount } from "@/app/features/accounts/load-account.server";
import type { Viewer } from "@/app/features/accounts/viewer";
import { requireScope } from "@/app/features/accounts/viewer-policy";
import { apiKeyForm, apiKeyPart } from "@/app/features/api-keys/api-key-form";
import { createApiKey } from "@/app/features/api-keys/create-api-key.server";
import { listApiKeys } from "@/app/features/api-keys/list-api-keys.server";
import { revokeApiKey } from "@/app/features/api-keys/revoke-api-key.server";
import { viewerOfApiKey } from "@/app/features/api-keys/viewer-of-api-key.server";
import { db } from "@/app/platform/db.server";
import { apiScopes, roles } from "@/drizzle/enums";
import { apiKeys, users } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";

useDatabase();

let author: Viewer;
let other: Viewer;

async function personWithRole(email: string, role: (typeof roles)[number]): Promise<Viewer> {
  const { userId } = await ensureAccount({ name: "Ines Roth", email, password: "seven grey herons", role });
  return loadAccount(userId, { scopes: null, apiKeyId: null });
}

beforeAll(async () => {
  author = await personWithRole("author@example.org", "author");
  other = await personWithRole("other@example.org", "author");
});

const plain = { name: "CI job", scopes: ["read", "submit"], expiresInDays: 90 } as const;
const input = () => ({ ...plain, scopes: [...plain.scopes] });

describe("an API token", () => {
  it("is shown once and kept as a hash", async () => {
    const { id, secret } = await createApiKey(author, input());
    expect(secret).toMatch(/^bks_[\w-]{43}$/);
    const [row] = await db.select().from(apiKeys).where(eq(apiKeys.id, id));
    expect(JSON.stringify(row)).not.toContain(secret);
    const listed = await listApiKeys(author);
    expect(JSON.stringify(listed)).not.toContain(secret);
    expect(secret.startsWith(listed[0].prefix)).toBe(true);
  });

  it("acts for its owner within its scopes and notes its use", async () => {
    const { id, secret } = await createApiKey(author, { ...input(), scopes: ["read"] });
    const viewer = await viewerOfApiKey(secret);
    expect(viewer).toMatchObject({ userId: author?.userId, scopes: ["read"], apiKeyId: id });
    expect(() => requireScope(viewer, "submit")).toThrowError(expect.objectContaining({ kind: "forbidden" }));
    const [row] = await db.select().from(apiKeys).where(eq(apiKeys.id, id));
    expect(row.lastUsedAt).not.toBeNull();
  });

  it("is nobody's once it is revoked, has expired, or its account is suspended", async () => {
    const revoked = await createApiKey(author, input());
    await revokeApiKey(author, revoked.id);
    expect(await viewerOfApiKey(revoked.secret)).toBeNull();

    const expired = await createApiKey(author, input());
    await db
      .update(apiKeys)
      .set({ expiresAt: new Date(Date.now() - 1) })
      .where(eq(apiKeys.id, expired.id));
    expect(await viewerOfApiKey(expired.secret)).toBeNull();

    const suspended = await createApiKey(other, input());
    await db
      .update(users)
      .set({ suspendedAt: new Date() })
      .where(eq(users.id, other?.userId ?? ""));
    expect(await viewerOfApiKey(suspended.secret)).toBeNull();
    await db.update(users).set({ suspendedAt: null });
  });

  it("lasts without end only where that was asked for", async () => {
    const { id } = await createApiKey(author, { ...input(), expiresInDays: null });
    const listed = await listApiKeys(author);
    expect(listed.find((key) => key.id === id)).toMatchObject({ expiresAt: null, isExpired: false });
    expect(apiKeyPart.safeParse({ ...input(), expiresInDays: undefined }).success).toBe(false);
  });

  it("does not exist for anybody but its owner", async () => {
    const { id, secret } = await createApiKey(author, input());
    await expect(revokeApiKey(other, id)).rejects.toMatchObject({ kind: "notFound" });
    await expect(revokeApiKey(author, "not-an-id")).rejects.toMatchObject({ kind: "notFound" });
    expect((await listApiKeys(other)).some((key) => key.id === id)).toBe(false);
    expect(await viewerOfApiKey(secret)).not.toBeNull();
  });

  it("is not given to a visitor", async () => {
    await expect(createApiKey(null, input())).rejects.toMatchObject({ kind: "unauthenticated" });
    await expect(listApiKeys(null)).rejects.toMatchObject({ kind: "unauthenticated" });
    await expect(revokeApiKey(null, "x")).rejects.toMatchObject({ kind: "unauthenticated" });
  });

  it("carries no scope beyond its owner's role", async () => {
    const allowed: Record<string, string[]> = {};
    for (const role of roles) {
      const viewer = await personWithRole(`${role}-scopes@example.org`, role);
      const tried = await Promise.all(
        apiScopes.map((scope) =>
          createApiKey(viewer, { ...input(), scopes: [scope] }).then(
            () => [scope],
            () => [],
          ),
        ),
      );
      allowed[role] = tried.flat();
    }
    expect(allowed).toEqual({
      author: ["read", "submit"],
      maintainer: ["read", "submit", "curate"],
      admin: ["read", "submit", "curate", "review"],
    });
  });

  it("cannot make another with more scopes than its own", async () => {
    const { secret } = await createApiKey(author, { ...input(), scopes: ["read"] });
    const viewer = await viewerOfApiKey(secret);
    await expect(createApiKey(viewer, input())).rejects.toMatchObject({
      kind: "invalid",
      details: { fields: { scopes: expect.any(String) } },
    });
  });
});

describe("the form of a token", () => {
  it("reads one ticked scope as a list and never as no expiry", () => {
    expect(apiKeyForm.parse({ name: "CI", scopes: "read", expiresInDays: "never" })).toEqual({
      name: "CI",
      scopes: ["read"],
      expiresInDays: null,
    });
  });

  it("asks for a name, a scope and an expiry, each at its field", () => {
    const issues = apiKeyForm.safeParse({ expiresInDays: "soon" }).error?.issues ?? [];
    expect(issues.map((issue) => issue.path[0]).sort()).toEqual(["expiresInDays", "name", "scopes"]);
  });

  it("refuses a scope that does not exist", () => {
    expect(apiKeyForm.safeParse({ name: "CI", scopes: ["root"], expiresInDays: "30" }).success).toBe(false);
  });
});

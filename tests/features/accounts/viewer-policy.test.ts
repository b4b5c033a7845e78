import { describe, expect, it } from "vitest";
import type { Account } from "@/app/features/accounts/viewer";
import {
  hasRole,
  isMember,
  requireAccount,
  requireRole,
  requireScope,
  requireVerified,
} from "@/app/features/accounts/viewer-policy";
import { roles } from "@/drizzle/enums";

const author: Account = {
  userId: "u1",
  name: "Ines Roth",
  email: "ines@example.org",
  role: "author",
  isEmailVerified: true,
  teams: [{ id: "t1", slug: "harbour", name: "Harbour" }],
  scopes: null,
  apiKeyId: null,
};

describe("who may do what", () => {
  it("lets each role do what the ones before it may, and no more", () => {
    const table = roles.map((role) => roles.map((needed) => hasRole({ ...author, role }, needed)));
    expect(table).toEqual([
      [true, false, false],
      [true, true, false],
      [true, true, true],
    ]);
  });

  it("asks a visitor to sign in before any question of role", () => {
    for (const role of roles) {
      expect(() => requireRole(null, role)).toThrowError(
        expect.objectContaining({ kind: "unauthenticated" }),
      );
    }
    expect(() => requireAccount(null)).toThrowError(expect.objectContaining({ kind: "unauthenticated" }));
  });

  it("refuses an account whose role is too low", () => {
    expect(() => requireRole(author, "admin")).toThrowError(expect.objectContaining({ kind: "forbidden" }));
    expect(requireRole({ ...author, role: "admin" }, "admin").userId).toBe("u1");
  });

  it("refuses an account whose address is not verified", () => {
    expect(() => requireVerified({ ...author, isEmailVerified: false })).toThrowError(
      expect.objectContaining({ kind: "forbidden" }),
    );
  });

  it("lets a token do only what its scopes name, and a browser session all", () => {
    const token: Account = { ...author, scopes: ["read"], apiKeyId: "k1" };
    expect(requireScope(token, "read")).toBe(token);
    expect(() => requireScope(token, "submit")).toThrowError(expect.objectContaining({ kind: "forbidden" }));
    expect(requireScope(author, "submit")).toBe(author);
  });

  it("knows a member by the team's id", () => {
    expect(isMember(author, "t1")).toBe(true);
    expect(isMember(author, "t2")).toBe(false);
    expect(isMember(null, "t1")).toBe(false);
  });
});

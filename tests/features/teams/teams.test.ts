import { beforeAll, describe, expect, it } from "vitest";
import { ensureAccount } from "@/app/features/accounts/ensure-account.server";
import { loadAccount } from "@/app/features/accounts/load-account.server";
import type { Account, Viewer } from "@/app/features/accounts/viewer";
import { createTeam } from "@/app/features/teams/create-team.server";
import { ensureTeam } from "@/app/features/teams/ensure-team.server";
import { listMyTeams } from "@/app/features/teams/list-teams.server";
import { teamForm } from "@/app/features/teams/team-form";
import { useDatabase } from "../../support/database";

useDatabase();

let viewer: Viewer;
let userId = "";

beforeAll(async () => {
  ({ userId } = await ensureAccount({
    name: "Ines Roth",
    email: "ines@example.org",
    password: "seven grey herons",
    role: "author",
  }));
  viewer = await loadAccount(userId, { scopes: null, apiKeyId: null });
});

describe("a team", () => {
  it("belongs to the one who makes it", async () => {
    const team = await createTeam(viewer, { name: "Harbour Group" });
    expect(team.slug).toBe("harbour-group");
    expect(await listMyTeams(viewer)).toMatchObject([{ slug: "harbour-group", role: "owner", members: 1 }]);
    const account = await loadAccount(userId, { scopes: null, apiKeyId: null });
    expect(account?.teams).toEqual([{ id: team.id, slug: "harbour-group", name: "Harbour Group" }]);
  });

  it("needs an address of its own", async () => {
    await createTeam(viewer, { name: "Reed Warbler" });
    await expect(createTeam(viewer, { name: "reed   warbler" })).rejects.toMatchObject({
      kind: "conflict",
      details: { fields: { name: expect.stringContaining("/teams/reed-warbler") } },
    });
  });

  it("is made by a verified account only", async () => {
    const unverified: Account = { ...(viewer as Account), isEmailVerified: false };
    await expect(createTeam(unverified, { name: "Early" })).rejects.toMatchObject({ kind: "forbidden" });
    await expect(createTeam(null, { name: "Early" })).rejects.toMatchObject({ kind: "unauthenticated" });
  });

  it("is not made with a token that may only read", async () => {
    const reader: Account = { ...(viewer as Account), scopes: ["read"], apiKeyId: "k" };
    await expect(createTeam(reader, { name: "Early" })).rejects.toMatchObject({ kind: "forbidden" });
  });

  it("needs a name that gives an address", () => {
    expect(teamForm.safeParse({ name: "流体" }).success).toBe(false);
    expect(teamForm.parse({ name: "  Harbour  " })).toEqual({ name: "Harbour" });
  });

  it("of the house is set up once, however often that is asked for", async () => {
    const first = await ensureTeam({ name: "House Team", ownerId: userId, isHouse: true });
    expect(await ensureTeam({ name: "House Team", ownerId: userId, isHouse: true })).toEqual(first);
    const listed = (await listMyTeams(viewer)).find((team) => team.id === first.id);
    expect(listed).toMatchObject({ isHouse: true, members: 1 });
  });
});

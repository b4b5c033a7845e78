import { describe, expect, it } from "vitest";
import type { Account } from "@/app/features/accounts/viewer";
import { canDownload, canSee, permissionsOf } from "@/app/features/submissions/submission-policy";
import { submissionStates, type ApiScope, type Role } from "@/drizzle/enums";

function account(role: Role, options: { isMember?: boolean; scopes?: ApiScope[] } = {}): Account {
  return {
    userId: "u",
    name: "Someone",
    email: "someone@example.test",
    role,
    isEmailVerified: true,
    teams: options.isMember ? [{ id: "team", slug: "team", name: "Team" }] : [],
    scopes: options.scopes ?? null,
    apiKeyId: options.scopes ? "k" : null,
  };
}

const inState = (state: (typeof submissionStates)[number]) => ({ state, teamId: "team" });
const statesWhere = (holds: (submission: ReturnType<typeof inState>) => boolean) =>
  submissionStates.filter((state) => holds(inState(state)));

describe("who sees a submission", () => {
  const publicOnes = ["listed", "superseded", "withdrawn"];

  it("is everyone once it is a record, and nobody outside before", () => {
    expect(statesWhere((submission) => canSee(null, submission))).toEqual(publicOnes);
    expect(statesWhere((submission) => canSee(account("author"), submission))).toEqual(publicOnes);
  });

  it("is its team and admins in every state", () => {
    expect(statesWhere((submission) => canSee(account("author", { isMember: true }), submission))).toEqual([
      ...submissionStates,
    ]);
    expect(statesWhere((submission) => canSee(account("admin"), submission))).toEqual([...submissionStates]);
  });

  it("is a maintainer while it is in review", () => {
    expect(statesWhere((submission) => canSee(account("maintainer"), submission)).sort()).toEqual(
      [...publicOnes, "inReview"].sort(),
    );
  });

  it("is a token only within its scopes", () => {
    const ci = account("author", { isMember: true, scopes: ["submit"] });
    expect(canSee(ci, inState("scored"))).toBe(true);
    expect(canSee(account("author", { isMember: true, scopes: ["curate"] }), inState("scored"))).toBe(false);
    expect(canSee(account("admin", { scopes: ["submit"] }), inState("inReview"))).toBe(false);
  });

  it("does not include the files of a withdrawn record, which stay with team and admins", () => {
    expect(canDownload(null, inState("withdrawn"))).toBe(false);
    expect(canDownload(account("author", { isMember: true }), inState("withdrawn"))).toBe(true);
    expect(canDownload(null, inState("superseded"))).toBe(true);
  });
});

describe("who may act on a submission", () => {
  it("is its team for handing in what is scored or returned", () => {
    const member = account("author", { isMember: true });
    expect(statesWhere((submission) => permissionsOf(member, submission).canHandIn)).toEqual([
      "scored",
      "returned",
    ]);
    expect(statesWhere((submission) => permissionsOf(account("admin"), submission).canHandIn)).toEqual([]);
    const unverified = { ...member, isEmailVerified: false };
    expect(statesWhere((submission) => permissionsOf(unverified, submission).canHandIn)).toEqual([]);
  });

  it("is an admin of another team for deciding what is in review", () => {
    expect(statesWhere((submission) => permissionsOf(account("admin"), submission).canDecide)).toEqual([
      "inReview",
    ]);
    const ownTeam = account("admin", { isMember: true });
    expect(statesWhere((submission) => permissionsOf(ownTeam, submission).canDecide)).toEqual([]);
    expect(statesWhere((submission) => permissionsOf(account("maintainer"), submission).canDecide)).toEqual(
      [],
    );
  });

  it("is its team or an admin for withdrawing a record", () => {
    for (const viewer of [account("admin"), account("author", { isMember: true })]) {
      expect(statesWhere((submission) => permissionsOf(viewer, submission).canWithdraw)).toEqual(["listed"]);
    }
    expect(statesWhere((submission) => permissionsOf(account("author"), submission).canWithdraw)).toEqual([]);
  });
});

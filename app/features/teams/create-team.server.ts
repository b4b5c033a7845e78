import { memberships, teams } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { AppError } from "@/app/platform/errors";
import type { Viewer } from "../accounts/viewer";
import { requireScope, requireVerified } from "../accounts/viewer-policy";
import { recordAuditEvent } from "../moderation/record-audit-event.server";
import { slugOfName } from "./slug-of-name";
import type { TeamInput } from "./team-form";

/** The viewer becomes the team's owner. The slug comes from the name and must be free. */
export async function createTeam(viewer: Viewer, input: TeamInput): Promise<{ id: string; slug: string }> {
  requireScope(viewer, "submit");
  const account = requireVerified(viewer);
  const slug = slugOfName(input.name);
  return db.transaction(async (tx) => {
    const [team] = await tx
      .insert(teams)
      .values({ slug, name: input.name })
      .onConflictDoNothing({ target: teams.slug })
      .returning({ id: teams.id, slug: teams.slug });
    if (!team) {
      const name = `A team already has the address /teams/${slug}. Choose a name that gives another.`;
      throw new AppError("conflict", name, { fields: { name } });
    }
    await tx.insert(memberships).values({ teamId: team.id, userId: account.userId, role: "owner" });
    await recordAuditEvent(tx, {
      actorId: account.userId,
      action: "team.created",
      subjectKind: "team",
      subjectId: team.id,
      detail: { slug },
    });
    return team;
  });
}

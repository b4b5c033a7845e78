import { asc, count, eq } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import type { MembershipRole } from "@/drizzle/enums";
import { memberships, teams } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import type { Viewer } from "../accounts/viewer";
import { requireAccount } from "../accounts/viewer-policy";

export interface TeamItem {
  id: string;
  slug: string;
  name: string;
  isHouse: boolean;
  /** What the viewer is in the team. */
  role: MembershipRole;
  members: number;
  createdAt: Date;
}

export async function listMyTeams(viewer: Viewer): Promise<TeamItem[]> {
  const account = requireAccount(viewer);
  const everyone = alias(memberships, "everyone");
  return db
    .select({
      id: teams.id,
      slug: teams.slug,
      name: teams.name,
      isHouse: teams.isHouse,
      role: memberships.role,
      members: count(everyone.userId),
      createdAt: teams.createdAt,
    })
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .innerJoin(everyone, eq(everyone.teamId, teams.id))
    .where(eq(memberships.userId, account.userId))
    .groupBy(teams.id, memberships.role)
    .orderBy(asc(teams.name));
}

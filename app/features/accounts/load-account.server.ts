import { and, asc, eq, isNull } from "drizzle-orm";
import { memberships, teams, users } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import type { Account } from "./viewer";

/** The account as one who acts; null where it does not exist or is suspended. */
export async function loadAccount(
  userId: string,
  means: Pick<Account, "scopes" | "apiKeyId">,
): Promise<Account | null> {
  const rows = await db
    .select({
      name: users.name,
      email: users.email,
      role: users.role,
      emailVerifiedAt: users.emailVerifiedAt,
      team: { id: teams.id, slug: teams.slug, name: teams.name },
    })
    .from(users)
    .leftJoin(memberships, eq(memberships.userId, users.id))
    .leftJoin(teams, eq(teams.id, memberships.teamId))
    .where(and(eq(users.id, userId), isNull(users.suspendedAt)))
    .orderBy(asc(teams.name));
  const [user] = rows;
  if (!user) return null;
  return {
    userId,
    name: user.name,
    email: user.email,
    role: user.role,
    isEmailVerified: user.emailVerifiedAt !== null,
    teams: rows.flatMap(({ team }) => (team ? [team] : [])),
    ...means,
  };
}

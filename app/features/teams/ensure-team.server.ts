import { eq } from "drizzle-orm";
import { memberships, teams } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { slugOfName } from "./slug-of-name";

/** A team with its owner, for whoever runs the installation: no page and no call reaches this. */
export async function ensureTeam(input: {
  name: string;
  ownerId: string;
  isHouse: boolean;
}): Promise<{ id: string; slug: string }> {
  const slug = slugOfName(input.name);
  return db.transaction(async (tx) => {
    await tx.insert(teams).values({ slug, name: input.name, isHouse: input.isHouse }).onConflictDoNothing();
    const [team] = await tx
      .select({ id: teams.id, slug: teams.slug })
      .from(teams)
      .where(eq(teams.slug, slug));
    await tx
      .insert(memberships)
      .values({ teamId: team.id, userId: input.ownerId, role: "owner" })
      .onConflictDoNothing();
    return team;
  });
}

import { eq } from "drizzle-orm";
import type { Role } from "@/drizzle/enums";
import { users } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { hashPassword } from "@/app/platform/password.server";
import type { JoinInput } from "./account-form";

/** A verified account with a role, for whoever runs the installation: no page and no call reaches this. */
export async function ensureAccount(input: JoinInput & { role: Role }): Promise<{ userId: string }> {
  const [known] = await db.select({ id: users.id }).from(users).where(eq(users.email, input.email));
  if (known) return { userId: known.id };
  const [created] = await db
    .insert(users)
    .values({
      email: input.email,
      name: input.name,
      passwordHash: await hashPassword(input.password),
      role: input.role,
      emailVerifiedAt: new Date(),
    })
    .returning({ id: users.id });
  return { userId: created.id };
}

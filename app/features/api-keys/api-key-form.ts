import { z } from "zod";
import { apiScopes } from "@/drizzle/enums";

/** Proposed by the page; the API takes any whole number of days up to the limit, or null for no expiry. */
export const proposedLifetimesDays = [30, 90, 365];
const longestLifetimeDays = 3650;

export const apiKeyPart = z.strictObject({
  name: z
    .string({ error: "Name the token after what will use it." })
    .trim()
    .min(1, "Name the token after what will use it.")
    .max(80, "A token's name has at most 80 characters."),
  scopes: z
    .array(z.enum(apiScopes), { error: "Choose at least one scope." })
    .min(1, "Choose at least one scope.")
    .max(apiScopes.length),
  expiresInDays: z.int("Choose when the token expires.").min(1).max(longestLifetimeDays).nullable(),
});
export type ApiKeyInput = z.infer<typeof apiKeyPart>;

/** The same from a form, whose fields are texts: "never" stands for no expiry. */
export const apiKeyForm = z
  .object({
    name: z.string().optional(),
    scopes: z.union([z.array(z.string()), z.string().transform((one) => [one])]).default([]),
    expiresInDays: z
      .string({ error: "Choose when the token expires." })
      .transform((text) => (text === "never" ? null : Number(text))),
  })
  .pipe(apiKeyPart);

export const revokeForm = z.object({ id: z.string().min(1) });

import { z } from "zod";
import { invalid } from "@/app/platform/errors";
import type { SubmissionState } from "@/drizzle/enums";

/** The lists of the moderation page, by the states that they hold. */
export const moderationTabs = ["waiting", "returned", "listed", "withdrawn"] as const;
export type ModerationTab = (typeof moderationTabs)[number];

export const tabStates: Record<ModerationTab, SubmissionState> = {
  waiting: "inReview",
  returned: "returned",
  listed: "listed",
  withdrawn: "withdrawn",
};

/** Stands for submissions without any finding. */
export const noFinding = "none";

const moderationQuery = z.object({
  tab: z.enum(moderationTabs).default("waiting"),
  finding: z
    .string()
    .regex(/^[a-z-]{1,60}$/)
    .nullable()
    .default(null),
});
export type ModerationQuery = z.infer<typeof moderationQuery>;

export function parseModerationQuery(search: URLSearchParams): ModerationQuery {
  const parsed = moderationQuery.safeParse({
    tab: search.get("tab") ?? undefined,
    finding: search.get("finding") || null,
  });
  if (parsed.success) return parsed.data;
  throw invalid(`The address names no list of this page. Use tab=${moderationTabs.join(", ")}.`);
}

import { z } from "zod";
import { invalid } from "@/app/platform/errors";

const noteSentence = "Write a note of 1 to 4000 characters: it says why.";

/** What listing, returning and withdrawing ask for. */
export const decisionForm = z.object({
  note: z.string(noteSentence).trim().min(1, noteSentence).max(4000, noteSentence),
});

/** A call's body: whether its note will do is asked after who calls. */
export const decisionBody = z.object({ note: z.string().default("") });

export function requireNote(note: unknown): string {
  const parsed = decisionForm.safeParse({ note });
  if (!parsed.success) throw invalid("A decision needs a note.", { note: noteSentence });
  return parsed.data.note;
}

import { z } from "zod";
import { slugOfName } from "./slug-of-name";

export const teamForm = z.object({
  name: z
    .string({ error: "Give the team's name." })
    .trim()
    .min(2, "A team's name has at least 2 characters.")
    .max(80, "A team's name has at most 80 characters.")
    .refine(
      (name) => slugOfName(name).length >= 2,
      "Use at least two letters or digits from the Latin alphabet.",
    ),
});
export type TeamInput = z.infer<typeof teamForm>;

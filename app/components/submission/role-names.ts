import type { RunRole } from "@/drizzle/enums";

export const roleNames: Record<RunRole, string> = {
  study: "study",
  timeStep: "time step",
  iteration: "iteration",
};

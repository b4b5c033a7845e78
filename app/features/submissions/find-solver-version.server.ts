import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/app/platform/db.server";
import { invalid } from "@/app/platform/errors";
import type { Claim } from "@/benchmarks/scoring/declaration";
import { solvers, solverVersions } from "@/drizzle/schema";
import type { DeclarationPart, SolverPart } from "./submission-form";

/** Finds the team's solver and version, or creates what is missing from the optional fields of the part. */
export async function findSolverVersion(
  tx: Transaction,
  teamId: string,
  part: SolverPart,
  claim: DeclarationPart["claim"],
): Promise<{ solverId: string; solverVersionId: string; claim: Claim }> {
  const solverId = (await findSolver(tx, teamId, part)) ?? (await createSolver(tx, teamId, part));
  const version =
    (await findVersion(tx, solverId, part.version)) ?? (await createVersion(tx, solverId, part, claim));
  return { solverId, solverVersionId: version.id, claim: claimOf(version) };
}

async function findSolver(tx: Transaction, teamId: string, part: SolverPart): Promise<string | null> {
  const [row] = await tx
    .select({ id: solvers.id, family: solvers.family, method: solvers.method })
    .from(solvers)
    .where(and(eq(solvers.teamId, teamId), eq(solvers.slug, part.solver)));
  if (!row) return null;
  if (part.family && part.family !== row.family) {
    throw invalid(
      `The solver ${part.solver} is registered with the family ${row.family}, not ${part.family}.`,
      {
        "solver.family": `Leave it out or give ${row.family}; a solver of another family needs a slug of its own.`,
      },
    );
  }
  return row.id;
}

async function createSolver(tx: Transaction, teamId: string, part: SolverPart): Promise<string> {
  if (!part.family || !part.method) {
    throw invalid(
      `The team has no solver ${part.solver} yet. Give its method family and method to register it.`,
      {
        ...(part.family ? {} : { "solver.family": "Needed for a new solver." }),
        ...(part.method
          ? {}
          : { "solver.method": "Needed for a new solver: the basis or stencil in a word or two." }),
      },
    );
  }
  await tx
    .insert(solvers)
    .values({
      teamId,
      slug: part.solver,
      name: part.name ?? part.solver,
      family: part.family,
      method: part.method,
    })
    .onConflictDoNothing();
  // Another submission of the team may have created it at the same moment.
  const id = await findSolver(tx, teamId, part);
  if (id === null) throw new Error(`The solver ${part.solver} is missing right after it was written.`);
  return id;
}

type VersionRow = Pick<typeof solverVersions.$inferSelect, "id" | "claimKind" | "formalOrder">;

async function findVersion(tx: Transaction, solverId: string, version: string): Promise<VersionRow | null> {
  const [row] = await tx
    .select({
      id: solverVersions.id,
      claimKind: solverVersions.claimKind,
      formalOrder: solverVersions.formalOrder,
    })
    .from(solverVersions)
    .where(and(eq(solverVersions.solverId, solverId), eq(solverVersions.version, version)));
  return row ?? null;
}

async function createVersion(
  tx: Transaction,
  solverId: string,
  part: SolverPart,
  claim: DeclarationPart["claim"],
): Promise<VersionRow> {
  await tx
    .insert(solverVersions)
    .values({
      solverId,
      version: part.version,
      claimKind: claim?.kind ?? "none",
      formalOrder: claim?.kind === "algebraic" ? claim.order : null,
      description: part.description ?? "",
    })
    .onConflictDoNothing();
  const row = await findVersion(tx, solverId, part.version);
  if (!row) throw new Error(`The version ${part.version} is missing right after it was written.`);
  return row;
}

function claimOf(version: VersionRow): Claim {
  if (version.claimKind === "algebraic" && version.formalOrder !== null) {
    return { kind: "algebraic", order: version.formalOrder };
  }
  return version.claimKind === "exponential" ? { kind: "exponential" } : { kind: "none" };
}

import type { GridKind } from "../grids/grid-kind";
import type { ProblemDefinition } from "../problems/definition";
import { type BoundedScheme, chebyshevScheme, secondOrderScheme } from "./bounded-scheme";
import { centralScheme, compactScheme, fourierScheme, type PeriodicScheme } from "./periodic-scheme";
import type { ProblemSolver, ReferenceSolver, SolvedRun } from "./reference-solver";
import { solveAiry } from "./solve-airy";
import { solveKortewegDeVries, solveSchroedinger } from "./solve-dispersive";
import {
  porousMediumSolver,
  solveLayeredDiffusion,
  solveLayeredDiffusionHarmonic,
  solveString,
} from "./solve-limited-smoothness";
import { solveSineGordon, solveVariableAdvection, solveWave } from "./solve-periodic-waves";
import { solveVorticity } from "./solve-vorticity";
import { solveBistable, solveFisher } from "./solve-reaction-diffusion";
import { solveBoundaryLayer, solveHeat, solveMixedPoisson } from "./solve-bounded";
import { solveAdvectionDiffusion, solvePeriodicHelmholtz } from "./solve-periodic-linear";
import { solveBurgers, solveNonlinearDiffusion } from "./solve-periodic-nonlinear";
import { suggestedNodesOf } from "./suggested-nodes";

const periodicSolvers: Record<string, ProblemSolver<PeriodicScheme>> = {
  "advection-exp-sine": solveAdvectionDiffusion,
  "advection-diffusion-gaussian": solveAdvectionDiffusion,
  "burgers-periodic": solveBurgers,
  "helmholtz-periodic-2d": solvePeriodicHelmholtz,
  "nonlinear-diffusivity": solveNonlinearDiffusion,
  "advection-variable-speed": solveVariableAdvection,
  "schrodinger-bright-soliton": solveSchroedinger,
  "sine-gordon-breather": solveSineGordon,
  "wave-poisson-kernel": solveWave,
  "advection-square-wave": solveAdvectionDiffusion,
  "advection-hat": solveAdvectionDiffusion,
};

/** Needs a formula for the third derivative, which the compact schemes here lack. */
const thirdDerivativeSolvers: Record<string, ProblemSolver<PeriodicScheme>> = {
  "kdv-soliton": solveKortewegDeVries,
};

/** Fourier collocation carries its one mode exactly on every grid, so that there is no convergence to show. */
const singleModeSolvers: Record<string, ProblemSolver<PeriodicScheme>> = {
  "vorticity-convected-vortex": solveVorticity,
};

const boundedSolvers: Record<string, ProblemSolver<BoundedScheme>> = {
  "heat-dirichlet": solveHeat,
  "heat-neumann-robin": solveHeat,
  "boundary-layer": solveBoundaryLayer,
  "poisson-mixed-2d": solveMixedPoisson,
  "fisher-front": solveFisher,
  "bistable-front": solveBistable,
  "heat-incompatible-data": solveHeat,
  "diffusivity-jump": solveLayeredDiffusion,
  "airy-oscillatory": solveAiry,
  "plucked-string": solveString,
};

/** Collocation would need an implicit stepper here, and its undershoots make the equation ill-posed. */
const frontSolvers: Record<string, ProblemSolver<BoundedScheme>> = {
  "porous-medium-2": porousMediumSolver(2),
  "porous-medium-3": porousMediumSolver(3),
};

/** What a solver does with the problems of one table. */
interface Capability {
  problems: string[];
  gridKind: GridKind;
  solve(problem: ProblemDefinition, n: number[]): SolvedRun;
}

function capability<Scheme>(
  table: Record<string, ProblemSolver<Scheme>>,
  scheme: Scheme,
  gridKind: GridKind,
): Capability {
  return {
    problems: Object.keys(table),
    gridKind,
    solve: (problem, n) => table[problem.slug](problem, n, scheme),
  };
}

/** The parts of a solver that follow from what it can solve. */
function solving(
  slug: string,
  capabilities: Capability[],
): Pick<ReferenceSolver, "slug" | "problems" | "gridKinds" | "suggestedNodes" | "solve" | "version"> {
  const capabilityFor = (problemSlug: string): Capability => {
    const found = capabilities.find(({ problems }) => problems.includes(problemSlug));
    if (!found) throw new RangeError(`${slug} does not solve "${problemSlug}"`);
    return found;
  };
  return {
    slug,
    version: "1.0.0",
    problems: capabilities.flatMap(({ problems }) => problems),
    gridKinds: (problemSlug) => {
      const { gridKind } = capabilityFor(problemSlug);
      return suggestedNodesOf(slug, problemSlug)[0].map(() => gridKind);
    },
    suggestedNodes: (problemSlug) => suggestedNodesOf(slug, problemSlug),
    solve(problem, n) {
      if (n.length !== problem.axes.length) {
        throw new RangeError(
          `${problem.slug} has ${problem.axes.length} axes; nodes of ${n.length} were given`,
        );
      }
      return capabilityFor(problem.slug).solve(problem, n);
    },
  };
}

function onPeriodicGrids(
  scheme: PeriodicScheme,
  ...tables: Record<string, ProblemSolver<PeriodicScheme>>[]
): Capability {
  return capability(Object.assign({}, periodicSolvers, ...tables), scheme, "uniform-periodic");
}

function centralSolver(order: 2 | 4 | 6): ReferenceSolver {
  const periodic = onPeriodicGrids(centralScheme(order), thirdDerivativeSolvers, singleModeSolvers);
  const bounded = capability({ ...boundedSolvers, ...frontSolvers }, secondOrderScheme, "uniform");
  const closures =
    "Fluxes of a variable diffusivity are taken at half points; ghost points close ends with a derivative condition.";
  return {
    ...solving(`house-fd${order}`, order === 2 ? [periodic, bounded] : [periodic]),
    name: `Central differences, order ${order}`,
    family: "finiteDifference",
    method: `Explicit central differences of order ${order} on a uniform grid`,
    formalOrder: order,
    claim: { kind: "algebraic", order },
    description: `Method of lines with explicit central differences of order ${order}. Linear problems are exact in time; the others use an embedded Runge-Kutta method of order 8 with steps that keep the time error far below the spatial one. ${order === 2 ? closures : "A diffusive flux is the first difference applied twice."}`,
    reconstruction: { kind: "piecewise-polynomial", degree: order + 1 },
  };
}

function compactSolver(order: 4 | 6): ReferenceSolver {
  return {
    ...solving(`house-compact${order}`, [onPeriodicGrids(compactScheme(order), singleModeSolvers)]),
    name: `Compact differences, order ${order}`,
    family: "compactDifference",
    method: `Tridiagonal compact differences of order ${order} (Lele 1992)`,
    formalOrder: order,
    claim: { kind: "algebraic", order },
    description: `Method of lines with Lele's tridiagonal schemes of order ${order} for the first and the second derivative. Linear problems are exact in time; the others use an embedded Runge-Kutta method of order 8 with steps that keep the time error far below the spatial one.`,
    reconstruction: { kind: "piecewise-polynomial", degree: order + 1 },
  };
}

const fourierSolver: ReferenceSolver = {
  ...solving("house-fourier", [onPeriodicGrids(fourierScheme, thirdDerivativeSolvers)]),
  name: "Fourier pseudo-spectral",
  family: "fourier",
  method: "Fourier collocation without dealiasing",
  formalOrder: null,
  claim: { kind: "exponential" },
  description:
    "Fourier collocation on uniform nodes, products formed at the nodes without dealiasing. Linear problems are exact in time; the others use an embedded Runge-Kutta method of order 8 with steps that keep the time error far below the spatial one.",
  reconstruction: { kind: "trigonometric" },
};

const chebyshevSolver: ReferenceSolver = {
  ...solving("house-cheb", [capability(boundedSolvers, chebyshevScheme, "chebyshev-lobatto")]),
  name: "Chebyshev collocation",
  family: "chebyshev",
  method: "Chebyshev-Lobatto collocation, boundary rows eliminated",
  formalOrder: null,
  claim: { kind: "exponential" },
  description:
    "Collocation on Chebyshev-Lobatto nodes; the end values are eliminated by the boundary conditions. Exact in time by the matrix exponential; steady problems are solved directly.",
  reconstruction: { kind: "polynomial" },
};

const harmonicSolver: ReferenceSolver = {
  ...solving("house-fd2-harmonic", [
    capability({ "diffusivity-jump": solveLayeredDiffusionHarmonic }, secondOrderScheme, "uniform"),
  ]),
  name: "Central differences, harmonic mean",
  family: "finiteDifference",
  method: "Fluxes at half points, harmonic mean of the diffusivity over each cell",
  formalOrder: 2,
  claim: { kind: "algebraic", order: 2 },
  description:
    "Second-order balance of fluxes between neighbouring nodes; the diffusivity of each cell is its exact harmonic mean, so that a jump inside a cell keeps the order.",
  reconstruction: { kind: "piecewise-polynomial", degree: 1 },
};

/** The house's own solvers. */
export const referenceSolvers: ReferenceSolver[] = [
  centralSolver(2),
  centralSolver(4),
  centralSolver(6),
  compactSolver(4),
  compactSolver(6),
  fourierSolver,
  chebyshevSolver,
  harmonicSolver,
];

/**
 * The reference solver of a slug.
 *
 * @throws RangeError where there is none
 * @example referenceSolver("house-fd4").claim // { kind: "algebraic", order: 4 }
 * @see referenceSolvers
 */
export function referenceSolver(slug: string): ReferenceSolver {
  const solver = referenceSolvers.find((candidate) => candidate.slug === slug);
  if (!solver) throw new RangeError(`there is no reference solver "${slug}"`);
  return solver;
}

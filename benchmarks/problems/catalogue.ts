import { advectionDiffusionGaussian } from "./advection-diffusion-gaussian";
import { advectionExpSine } from "./advection-exp-sine";
import { advectionVariableSpeed } from "./advection-variable-speed";
import { fisherFront } from "./fisher-front";
import { bistableFront } from "./bistable-front";
import { heatIncompatibleData } from "./heat-incompatible-data";
import { advectionSquareWave } from "./advection-square-wave";
import { advectionHat } from "./advection-hat";
import { diffusivityJump } from "./diffusivity-jump";
import { pluckedString } from "./plucked-string";
import { porousMedium2 } from "./porous-medium-2";
import { porousMedium3 } from "./porous-medium-3";
import { airyOscillatory } from "./airy-oscillatory";
import { boundaryLayer } from "./boundary-layer";
import { burgersPeriodic } from "./burgers-periodic";
import type { ProblemDefinition } from "./definition";
import { heatDirichlet } from "./heat-dirichlet";
import { heatNeumannRobin } from "./heat-neumann-robin";
import { helmholtzPeriodic2d } from "./helmholtz-periodic-2d";
import { kdvSoliton } from "./kdv-soliton";
import { nonlinearDiffusivity } from "./nonlinear-diffusivity";
import { poissonMixed2d } from "./poisson-mixed-2d";
import { schrodingerBrightSoliton } from "./schrodinger-bright-soliton";
import { sineGordonBreather } from "./sine-gordon-breather";
import { vorticityConvectedVortex } from "./vorticity-convected-vortex";
import { wavePoissonKernel } from "./wave-poisson-kernel";

/** The test problems that ship with the register, periodic ones first, by their codes. */
export const shippedProblems: ProblemDefinition[] = [
  advectionExpSine,
  advectionVariableSpeed,
  advectionDiffusionGaussian,
  burgersPeriodic,
  kdvSoliton,
  schrodingerBrightSoliton,
  sineGordonBreather,
  wavePoissonKernel,
  vorticityConvectedVortex,
  helmholtzPeriodic2d,
  nonlinearDiffusivity,
  advectionSquareWave,
  advectionHat,
  heatDirichlet,
  heatNeumannRobin,
  boundaryLayer,
  airyOscillatory,
  poissonMixed2d,
  fisherFront,
  bistableFront,
  porousMedium2,
  porousMedium3,
  diffusivityJump,
  heatIncompatibleData,
  pluckedString,
];

/**
 * The shipped problem of a slug.
 *
 * @param slug for example "advection-exp-sine"
 * @returns the definition, shared and not to be changed
 * @throws RangeError where no shipped problem has the slug
 * @example shippedProblem("heat-dirichlet").outputTimes // [0.1]
 */
export function shippedProblem(slug: string): ProblemDefinition {
  const problem = shippedProblems.find((candidate) => candidate.slug === slug);
  if (!problem) {
    const known = shippedProblems.map((candidate) => candidate.slug).join(", ");
    throw new RangeError(`no shipped problem has the slug "${slug}"; there are ${known}`);
  }
  return problem;
}

/** Doubling grids for schemes of a fixed order. */
const doubling = [16, 32, 64, 128, 256, 512];

/** Nodes per axis of the grids on which each solver's study is informative; by problem, else under "*". */
const sequences: Record<string, Record<string, number[]>> = {
  "house-fd2": {
    "airy-oscillatory": [65, 97, 129, 193, 257, 385, 513],
    "advection-square-wave": [64, 128, 256, 512, 1024],
    "advection-hat": [64, 128, 256, 512, 1024],
    "diffusivity-jump": [17, 33, 65, 129, 257, 513],
    "plucked-string": [33, 65, 129, 257, 513],
    "porous-medium-2": [31, 61, 121, 241, 481],
    "porous-medium-3": [31, 61, 121, 241, 481],

    "*": doubling,
    "advection-variable-speed": [128, 192, 256, 384, 512, 768],
    "kdv-soliton": [64, 96, 128, 192, 256],
    "schrodinger-bright-soliton": [128, 192, 256, 384, 512],
    "sine-gordon-breather": [128, 192, 256, 384, 512, 768],
    "vorticity-convected-vortex": [8, 12, 16, 24, 32, 48],

    "advection-diffusion-gaussian": [32, 64, 128, 256, 512, 1024],
    "helmholtz-periodic-2d": [16, 32, 64, 128, 256],
    "nonlinear-diffusivity": [16, 32, 64, 128, 256],
    "heat-dirichlet": [9, 17, 33, 65, 129, 257],
    "heat-neumann-robin": [9, 17, 33, 65, 129, 257],
    "boundary-layer": [17, 33, 65, 129, 257, 513, 1025],
    "poisson-mixed-2d": [9, 17, 33, 65, 129],
    "fisher-front": [21, 41, 81, 161, 321],
    "bistable-front": [21, 41, 81, 161, 321],
    "heat-incompatible-data": [9, 17, 33, 65, 129, 257],
  },
  "house-fd4": {
    "advection-square-wave": [64, 128, 256, 512, 1024],
    "advection-hat": [64, 128, 256, 512, 1024],

    "*": doubling,
    "advection-variable-speed": [128, 192, 256, 384, 512, 768],
    "kdv-soliton": [64, 96, 128, 192, 256],
    "schrodinger-bright-soliton": [128, 192, 256, 384, 512],
    "sine-gordon-breather": [128, 192, 256, 384, 512, 768],
    "vorticity-convected-vortex": [8, 12, 16, 24, 32, 48],

    "advection-diffusion-gaussian": [32, 64, 128, 256, 512, 1024],
    "helmholtz-periodic-2d": [16, 32, 64, 128, 256],
    "nonlinear-diffusivity": [16, 32, 64, 128, 256],
  },
  "house-fd6": {
    "advection-square-wave": [64, 128, 256, 512, 1024],
    "advection-hat": [64, 128, 256, 512, 1024],

    "*": [16, 32, 64, 128, 256],
    "advection-variable-speed": [128, 160, 192, 256, 384],
    "kdv-soliton": [96, 128, 160, 192, 256],
    "schrodinger-bright-soliton": [128, 160, 192, 256, 384],
    "sine-gordon-breather": [128, 192, 256, 384, 512],
    "vorticity-convected-vortex": [8, 10, 12, 16, 20, 24],

    "advection-diffusion-gaussian": [32, 64, 128, 256, 512],
    "helmholtz-periodic-2d": [16, 24, 32, 48, 64, 96, 128],
  },
  "house-compact4": {
    "advection-square-wave": [64, 128, 256, 512, 1024],
    "advection-hat": [64, 128, 256, 512, 1024],

    "*": [16, 32, 64, 128, 256],
    "advection-variable-speed": [128, 160, 192, 256, 384],
    "schrodinger-bright-soliton": [128, 160, 192, 256, 384],
    "sine-gordon-breather": [128, 192, 256, 384, 512],
    "vorticity-convected-vortex": [8, 10, 12, 16, 20, 24],

    "advection-diffusion-gaussian": [32, 64, 128, 256, 512],
    "helmholtz-periodic-2d": [16, 24, 32, 48, 64, 96, 128],
    "nonlinear-diffusivity": [16, 24, 32, 48, 64, 96, 128],
  },
  "house-compact6": {
    "advection-square-wave": [64, 128, 256, 512, 1024],
    "advection-hat": [64, 128, 256, 512, 1024],

    "*": [16, 24, 32, 48, 64, 96, 128],
    "advection-variable-speed": [128, 160, 192, 256, 384],
    "schrodinger-bright-soliton": [128, 160, 192, 256, 384],
    "sine-gordon-breather": [128, 192, 256, 384, 512],
    "vorticity-convected-vortex": [8, 10, 12, 16, 20, 24],

    "advection-diffusion-gaussian": [32, 48, 64, 96, 128, 192, 256],
    "nonlinear-diffusivity": [16, 24, 32, 48, 64, 96],
  },
  "house-fourier": {
    "advection-square-wave": [64, 128, 256, 512, 768],
    "advection-hat": [64, 128, 256, 512, 768],

    "*": [8, 10, 12, 14, 16, 18, 20, 22, 24, 28, 32],
    "advection-variable-speed": [96, 112, 128, 144, 160, 176, 192, 208],
    "kdv-soliton": [64, 80, 96, 112, 128, 144, 160],
    "schrodinger-bright-soliton": [96, 128, 160, 192, 224, 256, 288],
    "sine-gordon-breather": [128, 160, 192, 224, 256, 288, 320],
    "wave-poisson-kernel": [8, 12, 16, 20, 24, 28, 32, 36, 40, 48],

    "advection-diffusion-gaussian": [8, 10, 12, 14, 16, 18, 20, 22, 24, 28, 32, 36, 40, 48],
    "burgers-periodic": [12, 16, 20, 24, 28, 32, 36, 40, 48, 56, 64, 72, 80],
    "nonlinear-diffusivity": [12, 16, 20, 24, 28, 32, 36, 40, 48],
  },
  "house-fd2-bounded": {
    "*": [9, 17, 33, 65, 129, 257],
    "boundary-layer": [17, 33, 65, 129, 257, 513, 1025],
  },
  "house-cheb": {
    "airy-oscillatory": [21, 25, 27, 29, 31, 33, 35, 37, 39, 41, 43, 45, 49],
    "diffusivity-jump": [17, 25, 33, 49, 65, 97],
    "plucked-string": [17, 25, 33, 49, 65],

    // Every other number: odd and even ones converge apart on solutions with a symmetry.
    "heat-dirichlet": [5, 7, 9, 11, 13, 15, 17, 21],
    "heat-neumann-robin": [6, 8, 10, 12, 14, 16, 18, 20],
    "boundary-layer": [9, 11, 13, 15, 17, 19, 21, 23, 25, 27, 29, 33, 41],
    "poisson-mixed-2d": [6, 8, 10, 12, 14, 16, 18, 20],
    "fisher-front": [17, 21, 25, 29, 33, 37, 41, 45, 49, 57, 65],
    "bistable-front": [13, 17, 21, 25, 29, 33, 37, 41, 45, 49, 57],
    "heat-incompatible-data": [9, 11, 13, 15, 17, 19, 21, 23, 25, 29],
  },
  "house-fd2-harmonic": { "*": [17, 33, 65, 129, 257, 513] },
};

const planar = new Set(["helmholtz-periodic-2d", "poisson-mixed-2d", "vorticity-convected-vortex"]);

/**
 * Nodes along each axis for each grid of a reference solver's study on a problem.
 *
 * @throws RangeError where there is no solver of the slug
 * @example suggestedNodesOf("house-fd2", "helmholtz-periodic-2d")[0] // [16, 16]
 * @see referenceSolvers
 */
export function suggestedNodesOf(solverSlug: string, problemSlug: string): number[][] {
  const bySlug = sequences[solverSlug];
  if (!bySlug) throw new RangeError(`there is no reference solver "${solverSlug}"`);
  const sequence = bySlug[problemSlug] ?? bySlug["*"];
  return sequence.map((n) => (planar.has(problemSlug) ? [n, n] : [n]));
}

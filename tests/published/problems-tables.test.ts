import { describe, expect, it } from "vitest";

import { normsOf, sumErrors } from "@/benchmarks/norms/error-norms";
import { shippedProblem } from "@/benchmarks/problems/catalogue";
import { evaluateExact } from "@/benchmarks/problems/exact-solution";
import { weightsOf } from "@/benchmarks/quadrature/quadrature-weights";
import { referenceSolver } from "@/benchmarks/solvers/reference-solvers";

/**
 * Errors of independent implementations of the named schemes, from the project's reference catalogue of test problems
 * (computed with NumPy and SciPy; domain-integral norms). N counts intervals: bounded axes have N + 1 nodes.
 */
interface Row {
  intervals: number;
  l1: number;
  l2: number;
  max: number;
  relL2: number;
}

const row = (intervals: number, l1: number, l2: number, max: number, relL2: number): Row => ({
  intervals,
  l1,
  l2,
  max,
  relL2,
});

const tables: { problem: string; solver: string; rows: Row[] }[] = [
  {
    problem: "advection-exp-sine",
    solver: "house-fd2",
    rows: [
      row(16, 0.64488, 0.3478091, 0.2986079, 0.0919),
      row(32, 0.16591, 0.09274258, 0.08065508, 0.02451),
      row(64, 0.041904, 0.02342068, 0.0198776, 0.006188),
      row(128, 0.010472, 0.005866339, 0.004915403, 0.00155),
    ],
  },
  {
    problem: "advection-exp-sine",
    solver: "house-fd4",
    rows: [
      row(16, 0.10214, 0.05354121, 0.0504155, 0.01415),
      row(32, 0.0066321, 0.003820456, 0.003554226, 0.001009),
      row(64, 0.00042616, 0.0002458211, 0.0002272815, 6.495e-5),
      row(128, 2.6747e-5, 1.547603e-5, 1.435694e-5, 4.089e-6),
    ],
  },
  {
    problem: "advection-exp-sine",
    solver: "house-fourier",
    rows: [
      row(8, 0.0053707, 0.00238005, 0.001415099, 0.0006289),
      row(24, 7.3653e-12, 2.941683e-12, 1.251887e-12, 7.773e-13),
    ],
  },
  {
    problem: "advection-variable-speed",
    solver: "house-fd2",
    rows: [
      row(256, 0.10789, 0.1299671, 0.3295283, 0.3671),
      row(512, 0.023079, 0.03808181, 0.1076327, 0.1076),
      row(1024, 0.0057274, 0.009754087, 0.02697335, 0.02755),
    ],
  },
  {
    problem: "advection-variable-speed",
    solver: "house-fd4",
    rows: [
      row(256, 0.0063476, 0.009511566, 0.02483143, 0.02687),
      row(512, 0.00038072, 0.0006316501, 0.001710752, 0.001784),
      row(1024, 2.4053e-5, 3.996043e-5, 0.0001099329, 0.0001129),
    ],
  },
  {
    problem: "advection-variable-speed",
    solver: "house-fourier",
    rows: [
      row(96, 0.0032631, 0.00173481, 0.002279037, 0.0049),
      row(192, 1.2194e-8, 7.427315e-9, 9.770329e-9, 2.098e-8),
    ],
  },
  {
    problem: "advection-diffusion-gaussian",
    solver: "house-fd2",
    rows: [
      row(32, 0.023371, 0.03450854, 0.08833217, 0.1618),
      row(64, 0.0058293, 0.008976488, 0.02259327, 0.0421),
      row(128, 0.0014575, 0.002248344, 0.005504146, 0.01054),
      row(256, 0.0003642, 0.0005620166, 0.001366921, 0.002636),
    ],
  },
  {
    problem: "advection-diffusion-gaussian",
    solver: "house-fd4",
    rows: [
      row(32, 0.0017676, 0.002747496, 0.007131161, 0.01289),
      row(64, 0.00011546, 0.0001803522, 0.0004632278, 0.0008459),
      row(128, 7.2934e-6, 1.141113e-5, 2.920945e-5, 5.352e-5),
      row(256, 4.5732e-7, 7.154316e-7, 1.831669e-6, 3.355e-6),
    ],
  },
  {
    problem: "advection-diffusion-gaussian",
    solver: "house-fourier",
    rows: [
      row(8, 0.022831, 0.0325904, 0.07480209, 0.1532),
      row(24, 1.2548e-10, 2.417312e-10, 7.738098e-10, 1.134e-9),
      row(48, 7.3806e-17, 1.147507e-16, 3.885781e-16, 5.382e-16),
    ],
  },
  {
    problem: "burgers-periodic",
    solver: "house-fd2",
    rows: [
      row(32, 0.0011137, 0.0007024395, 0.0006468568, 0.00209),
      row(64, 0.00029031, 0.0001756201, 0.0001637611, 0.0005226),
      row(128, 7.2994e-5, 4.389589e-5, 4.14182e-5, 0.0001306),
      row(256, 1.8247e-5, 1.097327e-5, 1.03518e-5, 3.265e-5),
    ],
  },
  {
    problem: "burgers-periodic",
    solver: "house-fd4",
    rows: [
      row(32, 0.00026767, 0.0002138906, 0.0002890626, 0.0006364),
      row(64, 1.9471e-5, 1.540241e-5, 2.13333e-5, 4.583e-5),
      row(128, 1.2646e-6, 1.003197e-6, 1.398937e-6, 2.985e-6),
      row(256, 8.0074e-8, 6.338098e-8, 8.853851e-8, 1.886e-7),
    ],
  },
  {
    problem: "burgers-periodic",
    solver: "house-fourier",
    rows: [
      row(16, 0.0022134, 0.001025362, 0.0006215685, 0.003051),
      row(48, 2.3123e-9, 1.059576e-9, 6.551504e-10, 3.153e-9),
    ],
  },
  {
    problem: "kdv-soliton",
    solver: "house-fd2",
    rows: [
      row(128, 0.59547, 0.265097, 0.1940882, 0.1148),
      row(256, 0.14162, 0.06312956, 0.04681733, 0.02734),
    ],
  },
  {
    problem: "kdv-soliton",
    solver: "house-fd4",
    rows: [
      row(128, 0.021127, 0.005952771, 0.005868556, 0.002578),
      row(256, 0.0024132, 0.0007909747, 0.0007659248, 0.0003425),
    ],
  },
  {
    problem: "kdv-soliton",
    solver: "house-fourier",
    rows: [row(128, 2.3299e-5, 4.559895e-6, 2.705929e-6, 1.974e-6)],
  },
  {
    problem: "schrodinger-bright-soliton",
    solver: "house-fd2",
    rows: [
      row(256, 0.42488, 0.2095606, 0.1994295, 0.1048),
      row(512, 0.10341, 0.04997277, 0.04740481, 0.02499),
    ],
  },
  {
    problem: "schrodinger-bright-soliton",
    solver: "house-fd4",
    rows: [
      row(256, 0.02493, 0.01123114, 0.01070062, 0.005616),
      row(512, 0.0016331, 0.0007266906, 0.0007009714, 0.0003633),
    ],
  },
  {
    problem: "schrodinger-bright-soliton",
    solver: "house-fourier",
    rows: [
      row(192, 9.4777e-5, 1.849724e-5, 1.314469e-5, 9.249e-6),
      row(384, 1.5344e-10, 3.422899e-11, 2.353163e-11, 1.711e-11),
    ],
  },
  {
    problem: "sine-gordon-breather",
    solver: "house-fd2",
    rows: [
      row(256, 0.24867, 0.08532899, 0.04401157, 0.01183),
      row(512, 0.065181, 0.02239379, 0.01151199, 0.003104),
      row(1024, 0.016512, 0.005665121, 0.002909478, 0.0007852),
    ],
  },
  {
    problem: "sine-gordon-breather",
    solver: "house-fd4",
    rows: [
      row(256, 0.0078575, 0.002112017, 0.001035709, 0.0002927),
      row(512, 0.00051063, 0.000135987, 6.691597e-5, 1.885e-5),
      row(1024, 3.2233e-5, 8.56634e-6, 4.227914e-6, 1.187e-6),
    ],
  },
  {
    problem: "sine-gordon-breather",
    solver: "house-fourier",
    rows: [
      row(192, 3.6767e-5, 7.421977e-6, 2.46191e-6, 1.029e-6),
      row(384, 9.2415e-11, 2.206295e-11, 1.02589e-11, 3.058e-12),
    ],
  },
  {
    problem: "wave-poisson-kernel",
    solver: "house-fd2",
    rows: [
      row(32, 0.0082927, 0.004083811, 0.003050864, 0.002781),
      row(64, 0.0020944, 0.001023138, 0.0007472788, 0.0006966),
      row(128, 0.00052199, 0.0002558769, 0.0001854985, 0.0001742),
      row(256, 0.00013061, 6.397426e-5, 4.629023e-5, 4.356e-5),
    ],
  },
  {
    problem: "wave-poisson-kernel",
    solver: "house-fd4",
    rows: [
      row(32, 0.00038774, 0.0002075129, 0.0001589989, 0.0001413),
      row(64, 2.5714e-5, 1.360582e-5, 1.116482e-5, 9.264e-6),
      row(128, 1.618e-6, 8.609745e-7, 7.094599e-7, 5.862e-7),
      row(256, 1.0135e-7, 5.397986e-8, 4.467238e-8, 3.675e-8),
    ],
  },
  {
    problem: "wave-poisson-kernel",
    solver: "house-fourier",
    rows: [
      row(8, 0.012037, 0.005217845, 0.003380923, 0.003553),
      row(24, 2.8831e-7, 1.268006e-7, 8.222727e-8, 8.633e-8),
      row(48, 3.3462e-14, 1.472853e-14, 9.65894e-15, 1.003e-14),
    ],
  },
  {
    problem: "vorticity-convected-vortex",
    solver: "house-fd2",
    rows: [
      row(16, 0.89505, 0.1623732, 0.04599141, 0.02856),
      row(32, 0.22507, 0.0408112, 0.01156811, 0.007178),
      row(64, 0.056349, 0.01021636, 0.002908909, 0.001797),
    ],
  },
  {
    problem: "vorticity-convected-vortex",
    solver: "house-fd4",
    rows: [
      row(16, 0.027303, 0.004949366, 0.001399851, 0.0008706),
      row(32, 0.0017295, 0.0003136203, 8.889929e-5, 5.516e-5),
      row(64, 0.00010849, 1.966883e-5, 5.596164e-6, 3.46e-6),
    ],
  },
  {
    problem: "helmholtz-periodic-2d",
    solver: "house-fd2",
    rows: [
      row(16, 0.50128, 0.1326355, 0.1167805, 0.00926),
      row(32, 0.1248, 0.03266937, 0.02857538, 0.002281),
      row(64, 0.031103, 0.008137569, 0.007106607, 0.0005681),
      row(128, 0.0077693, 0.002032544, 0.001774347, 0.0001419),
    ],
  },
  {
    problem: "helmholtz-periodic-2d",
    solver: "house-fd4",
    rows: [
      row(16, 0.040179, 0.01106774, 0.01057744, 0.0007727),
      row(32, 0.0026972, 0.0007340934, 0.0007072008, 5.125e-5),
      row(64, 0.00017175, 4.668028e-5, 4.512118e-5, 3.259e-6),
      row(128, 1.0782e-5, 2.930679e-6, 2.835505e-6, 2.046e-7),
    ],
  },
  {
    problem: "helmholtz-periodic-2d",
    solver: "house-fourier",
    rows: [
      row(8, 0.041349, 0.008461118, 0.006109966, 0.0005907),
      row(24, 7.0241e-13, 1.491584e-13, 9.148238e-14, 1.041e-14),
    ],
  },
  {
    problem: "nonlinear-diffusivity",
    solver: "house-fd2",
    rows: [
      row(32, 0.0045519, 0.002425612, 0.002376726, 0.002113),
      row(64, 0.001137, 0.0006028705, 0.0005959049, 0.0005253),
      row(128, 0.00028402, 0.0001504993, 0.0001488836, 0.0001311),
    ],
  },
  {
    problem: "nonlinear-diffusivity",
    solver: "house-fd4",
    rows: [
      row(32, 0.00065274, 0.000376078, 0.0004143062, 0.0003277),
      row(64, 4.1586e-5, 2.400856e-5, 2.652011e-5, 2.092e-5),
      row(128, 2.6131e-6, 1.510659e-6, 1.682745e-6, 1.316e-6),
    ],
  },
  {
    problem: "nonlinear-diffusivity",
    solver: "house-fourier",
    rows: [
      row(24, 3.6358e-8, 1.46931e-8, 7.128984e-9, 1.28e-8),
      row(48, 1.7604e-13, 8.885532e-14, 6.816769e-14, 7.742e-14),
    ],
  },
  {
    problem: "advection-square-wave",
    solver: "house-fd2",
    rows: [
      row(64, 0.56823, 0.3899583, 0.6222131, 0.22),
      row(128, 0.41804, 0.301432, 0.5991432, 0.1701),
      row(256, 0.29866, 0.2320596, 0.5587412, 0.1309),
      row(512, 0.22409, 0.1944528, 0.6126945, 0.1097),
    ],
  },
  {
    problem: "advection-square-wave",
    solver: "house-fd4",
    rows: [
      row(64, 0.40653, 0.2886594, 0.5265544, 0.1629),
      row(128, 0.27909, 0.208786, 0.4784001, 0.1178),
      row(256, 0.19751, 0.1528909, 0.3865122, 0.08626),
      row(512, 0.13983, 0.1235345, 0.4811282, 0.0697),
    ],
  },
  {
    problem: "advection-square-wave",
    solver: "house-fourier",
    rows: [
      row(64, 0.096484, 0.1669708, 0.3725842, 0.0942),
      row(128, 0.048382, 0.08903914, 0.2541426, 0.05023),
      row(256, 0.024405, 0.07448423, 0.3262792, 0.04202),
      row(512, 0.012224, 0.04098205, 0.1884455, 0.02312),
    ],
  },
  {
    problem: "advection-hat",
    solver: "house-fd2",
    rows: [
      row(64, 0.064282, 0.03796413, 0.04683273, 0.0371),
      row(128, 0.028702, 0.01821835, 0.03129564, 0.0178),
      row(256, 0.012228, 0.009186459, 0.02062959, 0.008977),
      row(512, 0.0051371, 0.004530981, 0.01240767, 0.004428),
    ],
  },
  {
    problem: "advection-hat",
    solver: "house-fd4",
    rows: [
      row(64, 0.038733, 0.02091455, 0.02705143, 0.02044),
      row(128, 0.01459, 0.008373528, 0.01509564, 0.008183),
      row(256, 0.0055616, 0.003684945, 0.008451595, 0.003601),
      row(512, 0.00216, 0.001528712, 0.004611763, 0.001494),
    ],
  },
  {
    problem: "advection-hat",
    solver: "house-fourier",
    rows: [
      row(64, 0.0073201, 0.004661312, 0.008664398, 0.004555),
      row(128, 0.0035904, 0.002573941, 0.005908547, 0.002516),
      row(256, 0.00083392, 0.00073879, 0.002613807, 0.000722),
      row(512, 0.00032714, 0.0003450283, 0.00143498, 0.0003372),
    ],
  },
  {
    problem: "heat-dirichlet",
    solver: "house-fd2",
    rows: [
      row(16, 0.00075017, 0.0008359139, 0.001182161, 0.003172),
      row(64, 4.7014e-5, 5.222999e-5, 7.386437e-5, 0.0001982),
      row(128, 1.1755e-5, 1.305731e-5, 1.846583e-5, 4.955e-5),
    ],
  },
  {
    problem: "heat-dirichlet",
    solver: "house-cheb",
    rows: [
      row(8, 1.9625e-8, 2.303329e-8, 4.113755e-8, 8.74e-8),
      row(12, 1.7725e-13, 2.069039e-13, 3.638756e-13, 7.851e-13),
    ],
  },
  {
    problem: "heat-neumann-robin",
    solver: "house-fd2",
    rows: [
      row(16, 0.00036055, 0.000412953, 0.0007286996, 0.0004965),
      row(64, 2.2538e-5, 2.580386e-5, 4.550616e-5, 3.102e-5),
      row(128, 5.6348e-6, 6.450894e-6, 1.137607e-5, 7.755e-6),
    ],
  },
  {
    problem: "heat-neumann-robin",
    solver: "house-cheb",
    rows: [
      row(8, 1.6159e-6, 1.906772e-6, 3.876127e-6, 2.292e-6),
      row(12, 7.6508e-11, 8.948136e-11, 1.788376e-10, 1.076e-10),
    ],
  },
  {
    problem: "boundary-layer",
    solver: "house-fd2",
    rows: [
      row(16, 0.0063469, 0.01597021, 0.05573556, 0.03117),
      row(64, 0.00040624, 0.0009174527, 0.003020548, 0.001788),
      row(128, 0.00010168, 0.0002279476, 0.0007489586, 0.0004442),
    ],
  },
  {
    problem: "boundary-layer",
    solver: "house-cheb",
    rows: [
      row(12, 0.00011415, 0.0001237503, 0.0001862949, 0.0002412),
      row(16, 6.5346e-7, 7.093052e-7, 1.053105e-6, 1.382e-6),
      row(32, 7.9035e-16, 1.095213e-15, 2.664535e-15, 2.134e-15),
    ],
  },
  {
    problem: "airy-oscillatory",
    solver: "house-fd2",
    rows: [
      row(64, 0.017746, 0.02668789, 0.07654074, 0.08076),
      row(256, 0.0012631, 0.001597842, 0.004433636, 0.004835),
      row(512, 0.00031951, 0.0004003693, 0.001105754, 0.001211),
    ],
  },
  {
    problem: "airy-oscillatory",
    solver: "house-cheb",
    rows: [
      row(32, 2.2669e-7, 2.170583e-7, 3.309422e-7, 6.568e-7),
      row(40, 9.3549e-11, 7.965731e-11, 1.373075e-10, 2.41e-10),
    ],
  },
  {
    problem: "poisson-mixed-2d",
    solver: "house-fd2",
    rows: [
      row(8, 0.0051144, 0.006475373, 0.01295075, 0.01295),
      row(32, 0.00032515, 0.0004017888, 0.0008035777, 0.0008036),
      row(64, 8.1357e-5, 0.0001004109, 0.0002008218, 0.0002008),
    ],
  },
  {
    problem: "poisson-mixed-2d",
    solver: "house-cheb",
    rows: [
      row(8, 1.5824e-6, 2.159588e-6, 6.300903e-6, 4.319e-6),
      row(12, 5.2664e-11, 7.105988e-11, 2.028728e-10, 1.421e-10),
    ],
  },
  {
    problem: "fisher-front",
    solver: "house-fd2",
    rows: [
      row(80, 0.0018929, 0.00054818, 0.0002381952, 0.0001344),
      row(320, 0.00011813, 3.430363e-5, 1.503909e-5, 8.411e-6),
    ],
  },
  {
    problem: "fisher-front",
    solver: "house-cheb",
    rows: [
      row(24, 0.00063484, 0.0001552083, 6.062376e-5, 3.805e-5),
      row(48, 1.1235e-7, 2.281479e-8, 7.894471e-9, 5.594e-9),
      row(64, 2.4781e-10, 5.947488e-11, 2.608219e-11, 1.458e-11),
    ],
  },
  {
    problem: "bistable-front",
    solver: "house-fd2",
    rows: [
      row(40, 0.0044436, 0.001619405, 0.001047789, 0.0005121),
      row(160, 0.00027575, 0.0001006809, 6.520638e-5, 3.184e-5),
    ],
  },
  {
    problem: "bistable-front",
    solver: "house-cheb",
    rows: [
      row(16, 0.0053521, 0.001574202, 0.001131083, 0.0004978),
      row(32, 2.2821e-6, 7.2805e-7, 9.946981e-7, 2.302e-7),
      row(48, 2.7593e-9, 1.106353e-9, 1.116814e-9, 3.498e-10),
    ],
  },
  {
    problem: "porous-medium-2",
    solver: "house-fd2",
    rows: [
      row(60, 0.0056164, 0.004568842, 0.006753121, 0.002668),
      row(240, 0.00029314, 0.0002888396, 0.0008342406, 0.0001687),
      row(480, 5.7282e-5, 8.690811e-5, 0.0003798312, 5.075e-5),
    ],
  },
  {
    problem: "porous-medium-3",
    solver: "house-fd2",
    rows: [
      row(120, 0.0034903, 0.006198689, 0.01382053, 0.003145),
      row(240, 0.0022419, 0.003003067, 0.008960323, 0.001524),
    ],
  },
  {
    problem: "diffusivity-jump",
    solver: "house-fd2",
    rows: [
      row(16, 0.00028717, 0.0004298446, 0.001120645, 0.0201),
      row(64, 7.509e-5, 0.0001116616, 0.0003141019, 0.005224),
      row(128, 3.8171e-5, 5.662951e-5, 0.0001617728, 0.00265),
      row(512, 9.5068e-6, 1.411138e-5, 4.062997e-5, 0.0006603),
    ],
  },
  {
    problem: "diffusivity-jump",
    solver: "house-fd2-harmonic",
    rows: [
      row(16, 7.8201e-5, 0.0001170559, 0.0003051758, 0.005474),
      row(64, 4.7877e-6, 7.11955e-6, 2.002716e-5, 0.0003331),
      row(128, 1.1814e-6, 1.752656e-6, 5.00679e-6, 8.2e-5),
      row(512, 7.4091e-8, 1.09977e-7, 3.166497e-7, 5.146e-6),
    ],
  },
  {
    problem: "diffusivity-jump",
    solver: "house-cheb",
    rows: [
      row(16, 0.00021121, 0.000331938, 0.000930192, 0.01552),
      row(64, 0.00014591, 0.0002154341, 0.0006265587, 0.01008),
      row(128, 5.8393e-5, 8.646211e-5, 0.0002665127, 0.004045),
    ],
  },
  {
    problem: "heat-incompatible-data",
    solver: "house-fd2",
    rows: [
      row(16, 0.0018175, 0.002244921, 0.003634154, 0.00303),
      row(64, 0.00011489, 0.0001410869, 0.0002335897, 0.0001905),
      row(128, 2.8715e-5, 3.528134e-5, 5.847961e-5, 4.763e-5),
    ],
  },
  {
    problem: "heat-incompatible-data",
    solver: "house-cheb",
    rows: [
      row(16, 4.611e-9, 5.702463e-9, 1.056801e-8, 7.698e-9),
      row(32, 1.1479e-14, 1.749267e-14, 4.019007e-14, 2.361e-14),
    ],
  },
  {
    problem: "plucked-string",
    solver: "house-fd2",
    rows: [
      row(32, 0.0035987, 0.006125794, 0.0185305, 0.01857),
      row(128, 0.00069692, 0.001642881, 0.008151638, 0.00498),
      row(256, 0.00033856, 0.0008418205, 0.005176214, 0.002552),
    ],
  },
  {
    problem: "plucked-string",
    solver: "house-cheb",
    rows: [
      row(32, 0.0020332, 0.002904729, 0.008402106, 0.008789),
      row(64, 0.0004064, 0.0009951715, 0.005608337, 0.003016),
    ],
  },
];

/** Below this the rows sit on round-off or on the time integrator's tolerance and are upper bounds only. */
const floor = 3e-11;

function errorsOf(problemSlug: string, solverSlug: string, intervals: number) {
  const problem = shippedProblem(problemSlug);
  const solver = referenceSolver(solverSlug);
  const kinds = solver.gridKinds(problemSlug);
  const n = problem.axes.map((axis) => (axis.kind === "bounded" ? intervals + 1 : intervals));
  const run = solver.solve(problem, n);
  const exact = evaluateExact(problem, "u", problem.outputTimes.at(-1) ?? null, run.coordinates);
  const weights = problem.axes.map(({ a, b }, axis) => weightsOf(kinds[axis], run.coordinates[axis], a, b));
  return normsOf([sumErrors(run.fields.u, exact, weights)]);
}

describe.each(tables)("$solver on $problem reproduces the published errors", ({ problem, solver, rows }) => {
  it.each(rows)("on $intervals intervals", ({ intervals, l1, l2, max, relL2 }) => {
    const errors = errorsOf(problem, solver, intervals);
    if (relL2 < floor) {
      expect(errors.relL2).toBeLessThan(Math.max(10 * relL2, 1e-12));
      return;
    }
    // The tables carry 7, 5 and 4 digits; their own time integration moves the fifth.
    expect(Math.abs(errors.l2 / l2 - 1)).toBeLessThan(5e-4);
    expect(Math.abs(errors.l1 / l1 - 1)).toBeLessThan(5e-3);
    expect(Math.abs(errors.max / max - 1)).toBeLessThan(5e-3);
    expect(Math.abs((errors.relL2 ?? NaN) / relL2 - 1)).toBeLessThan(5e-3);
  });
});

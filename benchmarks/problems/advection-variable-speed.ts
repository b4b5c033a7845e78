import { periodicKinds } from "./allowed-grids";
import type { ProblemDefinition } from "./definition";

/** P-02: advection of a narrow pulse at a speed that varies in space. */
export const advectionVariableSpeed: ProblemDefinition = {
  slug: "advection-variable-speed",
  code: "P-02",
  title: "Advection with variable speed, narrow pulse",
  statement:
    "A narrow pulse runs round a periodic interval at a speed that varies by a factor of six. Where the speed falls the pulse is squeezed, where it rises it is stretched, so a grid must carry the pulse at its narrowest; after one circuit it has its first shape again. The equation is in advective form; the conservative form is another equation.",
  keywords: ["advection", "variable coefficient", "pulse", "phase error"],
  classification: {
    domain: "periodic",
    dimension: 1,
    isSteady: false,
    isLinear: true,
    smoothness: { kind: "entire" },
  },
  axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
  fields: [{ name: "u", values: "real", isScored: true }],
  parameters: [{ name: "a", value: 0.2, unit: "dimensionless", meaning: "smallest speed" }],
  expressions: [
    { name: "c", expression: "a + sin(x - 1)^2", meaning: "speed" },
    { name: "q", expression: "sqrt((a + 1)/a)", meaning: "ratio that turns angles into travel times" },
    { name: "m", expression: "sqrt(a*(a + 1))", meaning: "mean speed" },
    {
      name: "w",
      expression: "x - 1 - m*t + atan2((q - 1)*sin(x - 1)*cos(x - 1), cos(x - 1)^2 + q*sin(x - 1)^2)",
      meaning: "travel time to x, less t, as an angle",
    },
    {
      name: "X",
      expression: "w + atan2((1/q - 1)*sin(w)*cos(w), cos(w)^2 + sin(w)^2/q)",
      meaning: "place from which the value came, less 1",
    },
    { name: "r", expression: "mod(X + pi, 2*pi) - pi", meaning: "the same on the nearest turn" },
  ],
  equations: [{ field: "u", identity: "u_t + c*u_x = 0" }],
  initialTime: 0,
  initialConditions: [
    { field: "u", timeDerivative: 0, expression: "exp(-100*(mod(x - 1 + pi, 2*pi) - pi)^2)" },
  ],
  boundaryConditions: [],
  kinks: [],
  outputTimes: [12.825498301618641],
  exact: { kind: "expression", fields: { u: "exp(-100*r^2)" } },
  grids: {
    kinds: [periodicKinds],
    suggested: {
      "uniform-periodic": [64, 80, 96, 112, 128, 144, 160, 176, 192, 208, 224, 256, 512, 1024],
      "cell-centred": [256, 512, 1024],
    },
  },
  functional: null,
  ranksOnAbsoluteNorms: false,
  checkValues: [
    { field: "u", at: { x: 1.1, t: 1 }, value: 0.3433190207698833 },
    { field: "u", at: { x: 1.3, t: 1 }, value: 0.6539407036258905 },
    { field: "u", at: { x: 1.5, t: 1.5 }, value: 0.526325908331994 },
  ],
  notes: [
    "The final time 2 pi/sqrt(a(a + 1)) is one circuit of the domain, so the solution there equals the initial values.",
  ],
  sources: [
    {
      citation:
        "L. N. Trefethen, Spectral Methods in MATLAB, SIAM, 2000, program 6 (speed and pulse; the travel time in closed form is our own)",
      doi: "10.1137/1.9780898719598",
      isFromMemory: true,
    },
  ],
};

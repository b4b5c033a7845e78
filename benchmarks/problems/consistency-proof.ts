import { compileExpression } from "../expressions/compile-expression";
import { derivativeOrder, evaluateTaylor, type TaylorValue } from "../expressions/evaluate-taylor";
import { type Series, TaylorSpace } from "../expressions/taylor-space";
import { nodesOf } from "../grids/grid-nodes";
import type { Axis, BoundaryCondition, InitialCondition, ProblemDefinition } from "./definition";
import { evaluateExact } from "./exact-solution";
import { exactTaylor, fieldSeries, type Place, placeSeries, spaceVariables } from "./exact-taylor";
import { equationContext, identityTerms, readDerivativeName } from "./identity-terms";
import { isNearKink } from "./kinks";
import { contextOf } from "./problem-context";
import { DefectMeter, type ProofCheck } from "./proof-check";
import { quasiRandomPoints } from "./quasi-random";
import { weakResiduals } from "./weak-form";

/** The figures that show an exact solution to solve its problem. */
export interface ConsistencyProof {
  checks: ProofCheck[];
  holds: boolean;
}

const interiorPoints = 512;
const boundaryPoints = 128;
const equationLimit = 1e-10;
const builtInLimit = 1e-8;
const initialLimit = 1e-12;
const boundaryLimit = 1e-10;

/**
 * Prove that a problem's exact solution fits its equations and conditions.
 *
 * The residual of each equation at 512 quasi-random points of the space-time domain, the initial conditions there,
 * each boundary condition at 128 points, value and first derivative across the ends of periodic axes, and finite
 * values on every suggested grid. Defects are relative to the largest scale met: the sum of the terms' magnitudes
 * for an equation or a boundary condition, the size of the solution otherwise.
 *
 * @param problem the definition
 * @returns the figures; `holds` where every one is within its limit
 * @throws DataError `expression/...` where the definition cannot be read
 * @example proveConsistency(shippedProblem("heat-dirichlet")).holds // true
 * @see P. J. Roache, Code verification by the method of manufactured solutions, J. Fluids Eng. 124 (2002) 4-10
 */
export function proveConsistency(problem: ProblemDefinition): ConsistencyProof {
  const checks = [
    ...problem.equations.flatMap(({ identity }) => [
      checkEquation(problem, identity),
      ...checkWeakly(problem, identity),
    ]),
    ...problem.initialConditions.map((condition) => checkInitial(problem, condition)),
    ...problem.boundaryConditions.map((condition) => checkBoundary(problem, condition)),
    ...smoothPeriodicAxes(problem).map((axis) => checkPeriodicity(problem, axis)),
    checkEvaluation(problem),
  ];
  return { checks, holds: checks.every((check) => check.holds) };
}

/** Points of the space-time domain; `fixed` variables keep their values. */
function placesIn(problem: ProblemDefinition, count: number, fixed: Place): Place[] {
  const ranges = new Map<string, [number, number]>(problem.axes.map(({ name, a, b }) => [name, [a, b]]));
  if (!problem.classification.isSteady)
    ranges.set("t", [problem.initialTime, Math.max(...problem.outputTimes)]);
  const free = [...ranges].filter(([name]) => fixed[name] === undefined);
  if (free.length === 0) return [fixed];
  return quasiRandomPoints(count, free.length).map((point) => ({
    ...Object.fromEntries(free.map(([name, [low, high]], k) => [name, low + (high - low) * point[k]])),
    ...fixed,
  }));
}

function modulus({ re, im }: TaylorValue): number {
  return im === null ? Math.abs(re[0]) : Math.hypot(re[0], im[0]);
}

function checkEquation(problem: ProblemDefinition, identity: string): ProofCheck {
  const { compiled, signs } = identityTerms(identity, equationContext(problem));
  const fields = problem.fields.map((field) => field.name);
  const bare = (name: string) => name.replace(/^im /, "");
  const order = derivativeOrder(
    compiled,
    (name) => readDerivativeName(bare(name), fields)?.along.length ?? 0,
  );
  const space = new TaylorSpace(spaceVariables(problem), order);
  const meter = new DefectMeter();
  for (const place of placesIn(problem, interiorPoints, {})) {
    if (isNearKink(problem, place.x, place.t ?? null)) continue;
    const exact = exactTaylor(problem, space, place);
    const others = placeSeries(problem, space, place);
    const terms = evaluateTaylor(compiled, space, (name) => fieldSeries(name, exact, space) ?? others(name));
    const sum = (part: (term: TaylorValue) => number) =>
      terms.reduce((total, term, k) => total + signs[k] * part(term), 0);
    const residual = Math.hypot(
      sum(({ re }) => re[0]),
      sum(({ im }) => im?.[0] ?? 0),
    );
    meter.add(
      residual,
      terms.reduce((total, term) => total + modulus(term), 0),
      place,
    );
  }
  return meter.toCheck("equation", identity, problem.exact.kind === "builtIn" ? builtInLimit : equationLimit);
}

/** Across a kink the equation holds in its weak form. */
function checkWeakly(problem: ProblemDefinition, identity: string): ProofCheck[] {
  return problem.kinks.map((text, kink) => {
    const meter = new DefectMeter();
    const found = weakResiduals(problem, identity, kink);
    // A kink that no box of the domain holds leaves the equation unproven there.
    if (found.length === 0) meter.add(Infinity, 1, {});
    for (const { residual, scale, place } of found) meter.add(residual, scale, place);
    return meter.toCheck("equation", `${identity}, weakly about x = ${text}`, equationLimit);
  });
}

function checkInitial(problem: ProblemDefinition, condition: InitialCondition): ProofCheck {
  const context = contextOf(problem);
  const compiled = compileExpression(condition.expression, context);
  const space = new TaylorSpace(spaceVariables(problem), condition.timeDerivative);
  const meter = new DefectMeter();
  for (const place of placesIn(problem, interiorPoints, { t: problem.initialTime })) {
    const exact = exactTaylor(problem, space, place).get(condition.field);
    if (!exact) throw new RangeError(`${problem.slug} has no field "${condition.field}"`);
    const [given] = evaluateTaylor(compiled, space, placeSeries(problem, space, place));
    const derive = (series: Series) =>
      condition.timeDerivative === 1 ? space.differentiate(series, "t") : series;
    const re = derive(exact.re)[0];
    const im = exact.im === null ? 0 : derive(exact.im)[0];
    const defect = Math.hypot(re - given.re[0], im - (given.im?.[0] ?? 0));
    meter.add(defect, Math.hypot(re, im) + modulus(given), place);
  }
  const name = condition.timeDerivative === 1 ? `${condition.field}_t` : condition.field;
  return meter.toCheck("initial", `${name} = ${condition.expression}`, initialLimit);
}

function checkBoundary(problem: ProblemDefinition, condition: BoundaryCondition): ProofCheck {
  const axis = problem.axes.find(({ name }) => name === condition.axis);
  if (!axis) throw new RangeError(`${problem.slug} has no axis "${condition.axis}"`);
  const context = contextOf(problem);
  const [alpha, beta, g] = [condition.alpha, condition.beta, condition.g].map((text) =>
    compileExpression(text, context),
  );
  const space = new TaylorSpace(spaceVariables(problem), 1);
  const outward = condition.end === "a" ? -1 : 1;
  const meter = new DefectMeter();
  const sizes = largestParts(problem, condition, space);
  for (const place of placesIn(problem, boundaryPoints, { [axis.name]: axis[condition.end] })) {
    const valueOf = placeSeries(problem, space, place);
    const [a, b, right] = [alpha, beta, g].map(
      (compiled) => evaluateTaylor(compiled, space, valueOf)[0].re[0],
    );
    const parts = exactTaylor(problem, space, place).get(condition.field);
    const residual = (series: Series | null, data: number) =>
      series === null ? 0 : a * series[0] + b * outward * space.differentiate(series, axis.name)[0] - data;
    const defect = Math.hypot(residual(parts?.re ?? null, right), residual(parts?.im ?? null, 0));
    meter.add(defect, Math.abs(a) * sizes.value + Math.abs(b) * sizes.derivative + Math.abs(right), place);
  }
  const label = `${condition.field}, ${condition.kind} at ${axis.name} = ${axis[condition.end]}`;
  return meter.toCheck("boundary", label, boundaryLimit);
}

/** The largest value and derivative of a field in the domain: a homogeneous condition has no scale of its own. */
function largestParts(
  problem: ProblemDefinition,
  { field, axis }: Pick<BoundaryCondition, "field" | "axis">,
  space: TaylorSpace,
): { value: number; derivative: number } {
  const largest = { value: 0, derivative: 0 };
  for (const place of placesIn(problem, boundaryPoints, {})) {
    const value = exactTaylor(problem, space, place).get(field);
    if (!value) throw new RangeError(`${problem.slug} has no field "${field}"`);
    const slope = (series: Series) => space.differentiate(series, axis);
    const derivative = { re: slope(value.re), im: value.im && slope(value.im) };
    largest.value = Math.max(largest.value, modulus(value));
    largest.derivative = Math.max(largest.derivative, modulus(derivative));
  }
  return largest;
}

/** The ends of an axis say nothing about a solution that may jump there. */
function smoothPeriodicAxes(problem: ProblemDefinition): Axis[] {
  const { kind } = problem.classification.smoothness;
  const isSmooth = kind === "entire" || kind === "analytic";
  return problem.axes.filter((axis) => isSmooth && axis.kind === "periodic");
}

function checkPeriodicity(problem: ProblemDefinition, axis: Axis): ProofCheck {
  const space = new TaylorSpace(spaceVariables(problem), 1);
  const meter = new DefectMeter();
  for (const { name: field } of problem.fields) {
    const sizes = largestParts(problem, { field, axis: axis.name }, space);
    for (const place of placesIn(problem, boundaryPoints, { [axis.name]: axis.a })) {
      const left = exactTaylor(problem, space, place).get(field);
      const right = exactTaylor(problem, space, { ...place, [axis.name]: axis.b }).get(field);
      if (!left || !right) throw new RangeError(`${problem.slug} has no field "${field}"`);
      const gap = {
        re: space.combine(left.re, right.re, -1),
        im: left.im && right.im && space.combine(left.im, right.im, -1),
      };
      const slope = (series: Series) => space.differentiate(series, axis.name);
      const bend = modulus({ re: slope(gap.re), im: gap.im && slope(gap.im) });
      meter.add(Math.max(modulus(gap) / (sizes.value || 1), bend / (sizes.derivative || 1)), 1, place);
    }
  }
  return meter.toCheck("periodicity", `value and derivative across the ends of ${axis.name}`, boundaryLimit);
}

/** Every node of every suggested grid, at the initial and the output times. */
function checkEvaluation(problem: ProblemDefinition): ProofCheck {
  const times = problem.classification.isSteady ? [null] : problem.outputTimes;
  let bad = 0;
  let at: Place | null = null;
  for (const [kind, sequence] of suggestedGrids(problem)) {
    for (const n of sequence) {
      const coordinates = problem.axes.map(({ a, b }) => nodesOf(kind, n, a, b));
      for (const t of times) {
        for (const { name } of problem.fields) {
          const { values, imaginary } = evaluateExact(problem, name, t, coordinates);
          const found = [values, imaginary]
            .flatMap((part) => (part ? [firstNotFinite(part)] : []))
            .find((k) => k >= 0);
          if (found === undefined) continue;
          bad += 1;
          at ??= placeOfNode(problem, coordinates, found, t);
        }
      }
    }
  }
  return {
    what: "evaluation",
    label: "finite on every suggested grid",
    largest: bad,
    limit: 0,
    at,
    holds: bad === 0,
  };
}

function suggestedGrids(problem: ProblemDefinition) {
  return (Object.keys(problem.grids.suggested) as (keyof typeof problem.grids.suggested)[]).map(
    (kind) => [kind, problem.grids.suggested[kind] ?? []] as const,
  );
}

function firstNotFinite(values: Float64Array): number {
  return values.findIndex((value) => !Number.isFinite(value));
}

function placeOfNode(
  problem: ProblemDefinition,
  coordinates: Float64Array[],
  node: number,
  t: number | null,
): Place {
  const place: Place = t === null ? {} : { t };
  let rest = node;
  for (let axis = coordinates.length - 1; axis >= 0; axis--) {
    place[problem.axes[axis].name] = coordinates[axis][rest % coordinates[axis].length];
    rest = Math.floor(rest / coordinates[axis].length);
  }
  return place;
}

import { compileTrees, type ExpressionContext } from "../expressions/compile-expression";
import { derivativeOrder, evaluateTaylor } from "../expressions/evaluate-taylor";
import type { ExpressionNode } from "../expressions/expression-node";
import { TaylorSpace } from "../expressions/taylor-space";
import { gaussLegendre } from "../grids/legendre-rule";
import type { ProblemDefinition } from "./definition";
import { fieldSeries, type Place, placeSeries, exactTaylor, spaceVariables } from "./exact-taylor";
import { equationContext, identityTrees, readDerivativeName } from "./identity-terms";
import { kinkPlaces } from "./kinks";

/** The part of a term that stays with the solution, and the derivatives that move to the test function. */
interface WeakTerm {
  sign: number;
  factor: ExpressionNode[];
  integrand: ExpressionNode;
  along: string[];
}

/** A box of the space-time domain about a kink, on whose edge the test function vanishes. */
interface Box {
  x: number;
  halfWidth: number;
  t: number | null;
  halfTime: number;
}

const bumpPower = 6;
const rule = gaussLegendre(24);

/**
 * The residual of an equation in weak form about a kink, where the solution has no derivatives.
 *
 * Each term is multiplied by a smooth test function that vanishes with its derivatives on the edge of a box; the
 * derivatives of the term move to it by parts. The integrals are split at the kinks, with nodes that cluster towards
 * them so that square roots are integrated as well as polynomials.
 *
 * @param problem one-dimensional, with kinks
 * @param identity one of its equations
 * @param kink index of the kink
 * @returns residual, the scale to compare it with, and a place; one entry for each box that fits the domain
 * @throws DataError `expression/...` where the equation cannot be read
 * @example weakResiduals(problem, "u_t + c*u_x = 0", 0)
 * @see R. J. LeVeque, Finite Volume Methods for Hyperbolic Problems, Cambridge, 2002, section 11.11 (weak solutions)
 */
export function weakResiduals(
  problem: ProblemDefinition,
  identity: string,
  kink: number,
): { residual: number; scale: number; place: Place }[] {
  const context = equationContext(problem);
  const terms = identityTrees(identity, context).map(({ node, sign }) =>
    moveDerivatives(node, sign, problem, context),
  );
  return boxesAbout(problem, kink).map((box) => integrateOver(problem, context, terms, box));
}

function moveDerivatives(
  node: ExpressionNode,
  sign: number,
  problem: ProblemDefinition,
  context: ExpressionContext,
): WeakTerm {
  const fields = problem.fields.map((field) => field.name);
  const term: WeakTerm = { sign, factor: [], integrand: node, along: [] };
  for (;;) {
    const current = term.integrand;
    const derivative = current.kind === "name" ? readDerivativeName(current.name, fields) : null;
    if (current.kind === "negative") {
      term.sign = -term.sign;
      term.integrand = current.arg;
    } else if (derivative && current.kind === "name") {
      term.along.push(...derivative.along);
      term.integrand = { ...current, name: derivative.field };
    } else if (current.kind === "call" && current.name === "d" && current.args[1].kind === "name") {
      term.along.push(current.args[1].name);
      term.integrand = current.args[0];
    } else if (current.kind === "arithmetic" && current.sign === "*" && isConstant(current.left, context)) {
      term.factor.push(current.left);
      term.integrand = current.right;
    } else {
      return { ...term, sign: term.sign * (term.along.length % 2 === 0 ? 1 : -1) };
    }
  }
}

/** Numbers and scalars other than t. */
function isConstant(node: ExpressionNode, context: ExpressionContext): boolean {
  switch (node.kind) {
    case "number":
      return true;
    case "name":
      return (
        (context.scalars.includes(node.name) && node.name !== "t") || node.name === "pi" || node.name === "e"
      );
    case "negative":
      return isConstant(node.arg, context);
    case "arithmetic":
    case "comparison":
      return isConstant(node.left, context) && isConstant(node.right, context);
    case "conditional":
      return [node.test, node.then, node.otherwise].every((part) => isConstant(part, context));
    case "call":
      return node.name !== "d" && node.args.every((arg) => isConstant(arg, context));
  }
}

/** Boxes that hold the kink at all of their times and lie within the domain. */
function boxesAbout(problem: ProblemDefinition, kink: number): Box[] {
  const [{ a, b }] = problem.axes;
  if (problem.classification.isSteady) {
    const [x] = [kinkPlaces(problem, null)[kink]];
    return [{ x, halfWidth: 0.9 * Math.min(x - a, b - x), t: null, halfTime: 1 }];
  }
  const span = Math.max(...problem.outputTimes) - problem.initialTime;
  return [0.3, 0.5, 0.7].flatMap((part) => {
    const t = problem.initialTime + part * span;
    for (let halfTime = 0.1 * span; halfTime > 1e-3 * span; halfTime /= 2) {
      const x = kinkPlaces(problem, t)[kink];
      const reach = Math.max(
        ...[-1, 1].map((side) => Math.abs(kinkPlaces(problem, t + side * halfTime)[kink] - x)),
      );
      const halfWidth = 1.5 * reach + 0.02 * (b - a);
      if (x - halfWidth > a && x + halfWidth < b) return [{ x, halfWidth, t, halfTime }];
    }
    return [];
  });
}

function integrateOver(problem: ProblemDefinition, context: ExpressionContext, terms: WeakTerm[], box: Box) {
  const trees = terms.map(({ factor, integrand }) =>
    factor.reduce<ExpressionNode>(
      (product, left) => ({ kind: "arithmetic", sign: "*", left, right: product }),
      integrand,
    ),
  );
  const compiled = compileTrees(trees, context);
  const fields = problem.fields.map((field) => field.name);
  const order = derivativeOrder(compiled, (name) => readDerivativeName(name, fields)?.along.length ?? 0);
  const space = new TaylorSpace(spaceVariables(problem), order);
  let residual = 0;
  const sizes = terms.map(() => 0);
  for (const { place, weight } of pointsIn(problem, box)) {
    const exact = exactTaylor(problem, space, place);
    const others = placeSeries(problem, space, place);
    const values = evaluateTaylor(compiled, space, (name) => fieldSeries(name, exact, space) ?? others(name));
    terms.forEach((term, k) => {
      const part = weight * values[k].re[0] * testFunction(term.along, place, box);
      residual += term.sign * part;
      sizes[k] += Math.abs(part);
    });
  }
  const place: Place = box.t === null ? { x: box.x } : { x: box.x, t: box.t };
  return { residual: Math.abs(residual), scale: sizes.reduce((sum, size) => sum + size, 0), place };
}

/** Quadrature points of the box: Gauss points in time; in space split at every kink. */
function* pointsIn(problem: ProblemDefinition, box: Box): Generator<{ place: Place; weight: number }> {
  const times =
    box.t === null
      ? [{ t: null, weight: 1 }]
      : Array.from(rule.nodes, (node, k) => ({
          t: (box.t ?? 0) + node * box.halfTime,
          weight: rule.weights[k] * box.halfTime,
        }));
  for (const { t, weight } of times) {
    const inside = kinkPlaces(problem, t).filter((place) => Math.abs(place - box.x) < box.halfWidth);
    const ends = [box.x - box.halfWidth, ...inside.sort((p, q) => p - q), box.x + box.halfWidth];
    for (let k = 1; k < ends.length; k++) {
      const middle = (ends[k - 1] + ends[k]) / 2;
      for (const end of [ends[k - 1], ends[k]]) {
        for (let q = 0; q < rule.nodes.length; q++) {
          // x = end + (middle - end) s^2: nodes gather at the end, where a root may begin.
          const s = (rule.nodes[q] + 1) / 2;
          const x = end + (middle - end) * s * s;
          const stretch = Math.abs(middle - end) * s * rule.weights[q];
          yield { place: t === null ? { x } : { x, t }, weight: weight * stretch };
        }
      }
    }
  }
}

/** A derivative of the product of two bumps. */
function testFunction(along: string[], place: Place, box: Box): number {
  const inX = along.filter((direction) => direction === "x").length;
  const alongX = bump((place.x - box.x) / box.halfWidth, inX) / box.halfWidth ** inX;
  if (box.t === null) return alongX;
  const inTime = along.length - inX;
  return (alongX * bump((place.t - box.t) / box.halfTime, inTime)) / box.halfTime ** inTime;
}

/** (1 - s^2)^6 and its first two derivatives. */
function bump(s: number, derivative: number): number {
  const p = bumpPower;
  const inner = 1 - s * s;
  if (derivative === 0) return inner ** p;
  if (derivative === 1) return -2 * p * s * inner ** (p - 1);
  if (derivative === 2) return -2 * p * inner ** (p - 1) + 4 * p * (p - 1) * s * s * inner ** (p - 2);
  throw new RangeError(`the weak form carries derivatives up to the second, not the ${derivative}th`);
}

import { parseInContext } from "../expressions/compile-expression";
import { typesetExpression, typesetName, typesetNumber } from "../expressions/typeset-expression";
import { builtIn } from "./built-ins";
import type { Axis, BoundaryCondition, InitialCondition, ProblemDefinition } from "./definition";
import { equationContext, parseIdentity } from "./identity-terms";

/** A problem in LaTeX for KaTeX's mathematics mode, one formula an entry. */
export interface TypesetProblem {
  equations: string[];
  /** Named expressions that the equations and conditions refer to. */
  expressions: string[];
  /** One for each axis. */
  domain: string[];
  initial: string[];
  boundary: string[];
  exact: string[];
  parameters: string[];
}

/**
 * Write a problem's equations, conditions, parameters and exact solution in LaTeX.
 *
 * @param problem the definition
 * @returns formulas without delimiters
 * @throws DataError `expression/...` where the definition cannot be read
 * @example typesetProblem(shippedProblem("advection-exp-sine")).equations // ["u_t + c\\,u_x = 0"]
 * @see typesetExpression
 */
export function typesetProblem(problem: ProblemDefinition): TypesetProblem {
  return {
    equations: problem.equations.map(({ identity }) => typesetIdentity(problem, identity)),
    expressions: problem.expressions.map(
      ({ name, expression }) => `${typesetName(name)} = ${latexOf(problem, expression)}`,
    ),
    domain: problem.axes.map(typesetAxis),
    initial: problem.initialConditions.map((condition) => typesetInitial(problem, condition)),
    boundary: problem.boundaryConditions.map((condition) => typesetBoundary(problem, condition)),
    exact: typesetExact(problem),
    parameters: problem.parameters.map(({ name, value }) => `${typesetName(name)} = ${typesetNumber(value)}`),
  };
}

function latexOf(problem: ProblemDefinition, text: string): string {
  return typesetExpression(parseInContext(text, equationContext(problem)));
}

function typesetIdentity(problem: ProblemDefinition, identity: string): string {
  const { left, right } = parseIdentity(identity, equationContext(problem));
  return `${typesetExpression(left)} = ${typesetExpression(right)}`;
}

/** An end of an interval: multiples of pi are written as such. */
function typesetEnd(value: number): string {
  const turns = value / Math.PI;
  if (value === 0 || !Number.isInteger(turns)) return typesetNumber(value);
  if (Math.abs(turns) === 1) return turns < 0 ? "-\\pi" : "\\pi";
  return `${turns}\\pi`;
}

function typesetAxis({ name, a, b, kind }: Axis): string {
  return `${typesetEnd(a)} \\le ${name} ${kind === "periodic" ? "<" : "\\le"} ${typesetEnd(b)}`;
}

/** u(x, y, t) with some of its arguments given. */
function applied(problem: ProblemDefinition, field: string, given: Record<string, string>): string {
  const names = [...problem.axes.map((axis) => axis.name), ...(problem.classification.isSteady ? [] : ["t"])];
  return `${typesetName(field)}(${names.map((name) => given[name] ?? name).join(", ")})`;
}

function typesetInitial(problem: ProblemDefinition, condition: InitialCondition): string {
  const name = condition.timeDerivative === 1 ? `${condition.field}_t` : condition.field;
  const start = typesetNumber(problem.initialTime);
  const at = condition.isLimit ? `${start}^{+}` : start;
  return `${applied(problem, name, { t: at })} = ${latexOf(problem, condition.expression)}`;
}

function typesetBoundary(problem: ProblemDefinition, condition: BoundaryCondition): string {
  const { field, axis, end, alpha, beta, g } = condition;
  const place = problem.axes.find(({ name }) => name === axis);
  const given = { [axis]: place ? typesetEnd(place[end]) : axis };
  const value = term(problem, alpha, applied(problem, field, given));
  const slope = term(problem, beta, applied(problem, `${field}_${axis}`, given));
  // At the lower end the outward derivative is minus the derivative along the axis.
  const isMinus = end === "a" && slope !== null && !(value === null && g.trim() === "0");
  const left = [value, slope].filter((part) => part !== null);
  const joined = isMinus ? (value === null ? `-${slope}` : `${value} - ${slope}`) : left.join(" + ");
  return `${joined} = ${latexOf(problem, g)}`;
}

function term(problem: ProblemDefinition, coefficient: string, factor: string): string | null {
  const text = coefficient.trim();
  if (text === "0") return null;
  if (text === "1") return factor;
  const latex = latexOf(problem, text);
  return `${/[+-]/.test(latex) ? `(${latex})` : latex}\\,${factor}`;
}

function typesetExact(problem: ProblemDefinition): string[] {
  const { exact } = problem;
  if (exact.kind === "builtIn") {
    const { latex } = builtIn(exact.name);
    return Object.entries(latex).map(([field, text]) => `${applied(problem, field, {})} = ${text}`);
  }
  return Object.entries(exact.fields).map(
    ([field, text]) => `${applied(problem, field, {})} = ${latexOf(problem, text)}`,
  );
}

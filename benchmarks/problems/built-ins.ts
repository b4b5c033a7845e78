import type { GridPoint, GridValues } from "../expressions/evaluate-on-grid";
import type { TaylorValue } from "../expressions/evaluate-taylor";
import type { Series, TaylorSpace } from "../expressions/taylor-space";
import { airyTaylor } from "./airy-function";

/** An exact solution that no expression of the language states: a special function, an integral, a series. */
export interface BuiltInSolution {
  /** Right-hand side in LaTeX for each field. */
  latex: Record<string, string>;
  evaluate(field: string, point: GridPoint, out?: { values: Float64Array }): GridValues;
  /** About a place; `valueOf` gives the polynomial of an axis, t or a parameter. */
  taylor(field: string, space: TaylorSpace, valueOf: (variable: string) => Series): TaylorValue;
}

/** Ai(lambda x) with the parameter lambda. */
const airy: BuiltInSolution = {
  latex: { u: "\\operatorname{Ai}(\\lambda\\,x)" },
  evaluate(_field, { coordinates: [x], parameters }, out) {
    const lambda = parameters?.lambda ?? NaN;
    const values = out?.values ?? new Float64Array(x.length);
    for (let j = 0; j < x.length; j++) values[j] = airyTaylor(lambda * x[j], 0)[0];
    return { values, imaginary: null };
  },
  taylor(_field, space, valueOf) {
    const z = space.multiply(valueOf("lambda"), valueOf("x"));
    return { re: space.compose(airyTaylor(z[0], space.order), z), im: null };
  },
};

const solutions: Record<string, BuiltInSolution> = { airy };

/**
 * A built-in exact solution.
 *
 * @param name as a problem's definition gives it
 * @throws RangeError where there is none
 * @example builtIn("airy").latex.u
 * @see ExactSolution
 */
export function builtIn(name: string): BuiltInSolution {
  const found = solutions[name];
  if (!found)
    throw new RangeError(
      `there is no built-in solution "${name}"; there is ${Object.keys(solutions).join(", ")}`,
    );
  return found;
}

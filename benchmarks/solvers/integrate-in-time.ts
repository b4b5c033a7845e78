import {
  fifthOrderError,
  stageTimes,
  stageWeights,
  stepWeights,
  thirdOrderError,
} from "./dormand-prince-tableau";

/** Writes du/dt into `out`; must not keep or change `u`. */
export type RightHandSide = (t: number, u: Float64Array, out: Float64Array) => void;

export interface Integration {
  u: Float64Array;
  /** Accepted steps. */
  steps: number;
}

export interface Tolerances {
  relative: number;
  absolute: number;
}

/** Time errors far below any spatial error of the reference runs. */
export const tightTolerances: Tolerances = { relative: 1e-13, absolute: 1e-15 };

const stages = 12;
const mostSteps = 2_000_000;

/**
 * Integrate du/dt = f(t, u) with the embedded Runge-Kutta method of order 8 of Dormand and Prince.
 *
 * @param f right-hand side
 * @param u0 values at the start, left as they are
 * @param from start time
 * @param to end time, above the start
 * @param tolerances local error allowed per step, relative to each value plus an absolute part
 * @returns values at the end, a new array, and the number of steps
 * @throws RangeError where the end does not lie above the start
 * @throws Error where the step falls below what the time can carry, or after two million steps
 * @example integrateInTime((t, u, out) => { out[0] = -u[0]; }, Float64Array.of(1), 0, 1).u[0] // 1/e
 * @see E. Hairer, S. P. Norsett and G. Wanner, Solving Ordinary Differential Equations I, 2nd ed., 1993, section II.5
 */
export function integrateInTime(
  f: RightHandSide,
  u0: Float64Array,
  from: number,
  to: number,
  tolerances: Tolerances = tightTolerances,
): Integration {
  if (!(to > from)) throw new RangeError(`the end time must lie above the start ${from}; it is ${to}`);
  const stepper = new Stepper(f, u0, tolerances);
  let t = from;
  let h = stepper.firstStep(from, to - from);
  let steps = 0;
  let wasRejected = false;
  while (t < to) {
    if (steps > mostSteps) throw new Error(`more than ${mostSteps} time steps were needed to reach ${to}`);
    h = Math.min(h, to - t);
    if (t + h <= t) throw new Error(`the time step fell to ${h} at t = ${t}`);
    const error = stepper.attempt(t, h);
    const factor = error === 0 ? 10 : 0.9 * Math.pow(error, -1 / 8);
    if (error < 1) {
      stepper.accept();
      t = h === to - t ? to : t + h;
      steps += 1;
      h *= Math.min(wasRejected ? 1 : 10, factor);
    } else {
      h *= Number.isFinite(factor) ? Math.max(0.2, factor) : 0.2;
    }
    wasRejected = error >= 1;
  }
  return { u: stepper.u, steps };
}

class Stepper {
  u: Float64Array;
  private next: Float64Array;
  private readonly slopes: Float64Array[];
  private readonly stage: Float64Array;

  constructor(
    private readonly f: RightHandSide,
    u0: Float64Array,
    private readonly tolerances: Tolerances,
  ) {
    this.u = u0.slice();
    this.next = new Float64Array(u0.length);
    this.stage = new Float64Array(u0.length);
    this.slopes = Array.from({ length: stages + 1 }, () => new Float64Array(u0.length));
  }

  /** The starting step of Hairer, Norsett and Wanner, section II.4, without its second evaluation. */
  firstStep(t: number, length: number): number {
    this.f(t, this.u, this.slopes[0]);
    const size = this.norm(this.u, this.u);
    const slope = this.norm(this.slopes[0], this.u);
    const h = size < 1e-5 || slope < 1e-5 ? 1e-6 : (0.01 * size) / slope;
    return Math.min(h, length);
  }

  /** Take a step without keeping it; the weighted error, below 1 where it may be kept. */
  attempt(t: number, h: number): number {
    const { f, u, stage, slopes, next } = this;
    for (let s = 1; s < stages; s++) {
      this.combine(stageWeights[s], h, stage);
      f(t + stageTimes[s] * h, stage, slopes[s]);
    }
    this.combine(stepWeights, h, next);
    f(t + h, next, slopes[stages]);
    let fifth = 0;
    let third = 0;
    for (let j = 0; j < u.length; j++) {
      let e5 = 0;
      let e3 = 0;
      for (let s = 0; s <= stages; s++) {
        e5 += fifthOrderError[s] * slopes[s][j];
        e3 += thirdOrderError[s] * slopes[s][j];
      }
      const scale =
        this.tolerances.absolute + this.tolerances.relative * Math.max(Math.abs(u[j]), Math.abs(next[j]));
      fifth += (e5 / scale) ** 2;
      third += (e3 / scale) ** 2;
    }
    if (fifth === 0 && third === 0) return 0;
    const error = (h * fifth) / Math.sqrt((fifth + 0.01 * third) * u.length);
    return Number.isNaN(error) ? Infinity : error;
  }

  accept(): void {
    [this.u, this.next] = [this.next, this.u];
    [this.slopes[0], this.slopes[stages]] = [this.slopes[stages], this.slopes[0]];
  }

  /** u plus h times a weighted sum of slopes. */
  private combine(weights: readonly number[], h: number, out: Float64Array): void {
    out.set(this.u);
    for (let s = 0; s < weights.length; s++) {
      const weight = h * weights[s];
      if (weight === 0) continue;
      const slope = this.slopes[s];
      for (let j = 0; j < out.length; j++) out[j] += weight * slope[j];
    }
  }

  private norm(values: Float64Array, scaleBy: Float64Array): number {
    const { absolute, relative } = this.tolerances;
    const sum = values.reduce(
      (total, value, j) => total + (value / (absolute + relative * Math.abs(scaleBy[j]))) ** 2,
      0,
    );
    return Math.sqrt(sum / values.length);
  }
}

import type { Place } from "./exact-taylor";

/** One figure of a consistency proof. */
export interface ProofCheck {
  what: "equation" | "initial" | "boundary" | "periodicity" | "evaluation";
  /** What was checked, for people: the identity, the end of an axis, the grid. */
  label: string;
  /** Largest defect over the largest scale; of an evaluation the number of values that are not finite. */
  largest: number;
  limit: number;
  /** Where the largest defect is. */
  at: Place | null;
  holds: boolean;
}

/** Collects defects at many points; the scale is the largest met anywhere, so that a zero of it does no harm. */
export class DefectMeter {
  private defect = 0;
  private scale = 0;
  private place: Place | null = null;

  add(defect: number, scale: number, place: Place): void {
    if (!(defect <= this.defect)) {
      this.defect = Number.isFinite(defect) ? defect : Infinity;
      this.place = place;
    }
    this.scale = Math.max(this.scale, Number.isFinite(scale) ? scale : 0);
  }

  /** The check; a figure that is not finite is written as the largest number, which JSON can carry. */
  toCheck(what: ProofCheck["what"], label: string, limit: number): ProofCheck {
    const ratio = this.defect === 0 ? 0 : this.defect / this.scale;
    const largest = Number.isFinite(ratio) ? ratio : Number.MAX_VALUE;
    return { what, label, largest, limit, at: this.place, holds: largest <= limit };
  }
}

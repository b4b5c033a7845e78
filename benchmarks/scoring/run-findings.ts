/** Findings about single runs. None refuses anything. */

import type { Declaration, RunDeclaration } from "./declaration";
import type { Finding, RunScore } from "./result";

const digits = (value: number) => Number(value.toPrecision(3)).toString();

/** Coordinates nearer to the declared nodes than this, over L, are as good as equal. */
const quietOffset = { double: 1e-12, single: 1e-7 };
/** An error must be this many times smaller under another reading to say so. */
const transposedFactor = 100;
const timeShiftFactor = 10;
/** A listed grid with gaps wider than this many L/N says little between its nodes. */
const widestGap = 4;

type Draft = Omit<Finding, "run">;

function findInFile(declaration: Declaration, { reading }: RunScore): Draft[] {
  const drafts: Draft[] = [];
  const { coordinateOffset, holdsSinglePrecisionOnly, numberType, significantDigits } = reading;
  const isSingle = numberType === "float32" || numberType === "complex64";
  const isQuiet = isSingle || declaration.precision === "float32" ? quietOffset.single : quietOffset.double;
  if (coordinateOffset !== null && coordinateOffset > isQuiet) {
    const message = `The file's coordinates differ from the declared nodes by up to ${digits(coordinateOffset)} L. The exact solution was evaluated at the declared nodes.`;
    drafts.push({
      code: "coordinates-off",
      severity: "note",
      message,
      figures: { offset: coordinateOffset },
    });
  }
  if (reading.hadRepeatedEnd) {
    const message =
      "The file repeats the first node of the periodic axis at its end; the repeat was dropped.";
    drafts.push({ code: "end-node-repeated", severity: "note", message, figures: {} });
  }
  if (reading.wasReversed) {
    const message = "The file runs from the right end to the left; it was reversed with its field.";
    drafts.push({ code: "descending-order", severity: "note", message, figures: {} });
  }
  if (isSingle || holdsSinglePrecisionOnly) {
    const isUndeclared = declaration.precision === "float64";
    const message = isSingle
      ? `The field is stored as ${numberType}.`
      : `The field is stored as ${numberType} and holds only single-precision values.`;
    drafts.push({
      code: "precision",
      severity: isUndeclared ? "warning" : "note",
      message,
      figures: { numberType },
    });
  }
  if (significantDigits !== null && !isSingle) {
    const floor = 5 * 10 ** -significantDigits;
    const message = `No value carries more than ${significantDigits} significant digits, which sets a floor of about ${digits(floor)}. Write 17.`;
    drafts.push({ code: "few-digits", severity: "warning", message, figures: { digits: significantDigits } });
  }
  if (reading.largestGap !== null && reading.largestGap > widestGap) {
    const message = `The largest gap of the listed grid is ${digits(reading.largestGap)} L/N; above ${widestGap} L/N a study ranks between the nodes only.`;
    drafts.push({ code: "wide-gap", severity: "warning", message, figures: { gap: reading.largestGap } });
  }
  return drafts;
}

function findMisreading({ reading, times }: RunScore): Draft[] {
  const drafts: Draft[] = [];
  const { relL2 } = times[times.length - 1].nodes;
  const { transposedError, timeShift } = reading;
  if (relL2 !== null && transposedError !== null && transposedError * transposedFactor <= relL2) {
    const message = `The relative L2 error falls from ${digits(relL2)} to ${digits(transposedError)} when the axes are exchanged. The first axis of the array is x.`;
    const figures = { declared: relL2, exchanged: transposedError };
    drafts.push({ code: "transposed", severity: "warning", message, figures });
  }
  if (timeShift && timeShift.factor >= timeShiftFactor) {
    const { shift, factor } = timeShift;
    const message = `The error is ${digits(factor)} times smaller against the exact solution at t + q with q = ${digits(shift)}. The field may be at another time than the one asked for, or the whole error of the scheme acts as a delay.`;
    drafts.push({ code: "wrong-time", severity: "note", message, figures: { shift, factor } });
  }
  return drafts;
}

/**
 * Findings that one run alone gives rise to.
 *
 * @example findInRuns(declaration, run).map(({ code }) => code)
 * @see the page /scoring, "Findings"
 */
export function findInRuns(
  declaration: Declaration,
  run: { declaration: RunDeclaration; score: RunScore },
): Finding[] {
  const { score } = run;
  return [...findInFile(declaration, score), ...findMisreading(score)].map((draft) => ({
    ...draft,
    run: score.n,
  }));
}

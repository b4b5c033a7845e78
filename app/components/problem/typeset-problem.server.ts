import { formatAllDigits } from "@/app/components/ui/figures";
import type { ProblemView } from "@/app/features/problems/problem-view";
import { typesetName } from "@/benchmarks/expressions/typeset-expression";
import type { CheckValue, ProblemDefinition } from "@/benchmarks/problems/definition";
import { type DomainFigure, domainFigure } from "./domain-figure";
import type { GivenNumber } from "./given-numbers";
import type { ProblemPage } from "./problem-page";
import { typesetMath } from "./typeset-math.server";

const mostFigures = 200;
const figures = new Map<string, DomainFigure>();

/** Everything of a problem's page that takes work and never changes with the reader. */
export function typesetProblemPage(problem: ProblemView): ProblemPage {
  const { definition, typeset } = problem;
  const { statement, classification, axes, boundaryConditions, sources, fields, grids, notes, outputTimes } =
    definition;
  const { slug, code, title, revision, publishedAt, isCurrent, proof, revisions } = problem;
  return {
    ...{ slug, code, title, revision, publishedAt, isCurrent, proof, revisions },
    definition: {
      statement,
      classification,
      axes,
      boundaryConditions,
      sources,
      fields,
      grids,
      notes,
      outputTimes,
    },
    rows: [
      { label: "Equation", formulas: typeset.equations },
      { label: "Domain", formulas: [[...typeset.domain, ...timeRange(definition)].join(", \\quad ")] },
      { label: "With", formulas: typeset.expressions },
      { label: "Initial", formulas: typeset.initial },
      { label: "Boundary", formulas: typeset.boundary },
      { label: "Exact solution", formulas: typeset.exact },
    ]
      .filter((row) => row.formulas.length > 0)
      .map((row) => ({
        ...row,
        formulas: row.formulas.map((latex) => typesetMath(latex, { isDisplay: true })),
      })),
    intervals: typeset.domain.map((latex) => typesetMath(latex)),
    numbers: [...definition.parameters.map(toNumber), ...definition.checkValues.flatMap(toNumbers)],
    figure: figureOf(`${slug} ${revision}`, definition),
  };
}

function timeRange({ classification, initialTime, outputTimes }: ProblemDefinition): string[] {
  if (classification.isSteady) return [];
  return [`${initialTime} \\le t \\le ${Math.max(...outputTimes)}`];
}

function toNumber({ name, value, unit, meaning }: ProblemDefinition["parameters"][number]): GivenNumber {
  return {
    symbol: typesetMath(typesetName(name)),
    value: formatAllDigits(value),
    meaning: [meaning, unit].filter((part) => part !== "").join(", "),
  };
}

function toNumbers({ field, at, value, imaginary }: CheckValue): GivenNumber[] {
  const place = [at.x, at.y, at.t].filter((coordinate) => coordinate !== undefined).join(", ");
  const symbol = `${typesetName(field)}(${place})`;
  const real = { symbol: typesetMath(symbol), value: formatAllDigits(value), meaning: "check value" };
  if (imaginary === undefined) return [real];
  return [
    { ...real, meaning: "check value, real part" },
    {
      symbol: typesetMath(`\\operatorname{Im} ${symbol}`),
      value: formatAllDigits(imaginary),
      meaning: "check value, imaginary part",
    },
  ];
}

/** A published revision never changes. */
function figureOf(key: string, definition: ProblemDefinition): DomainFigure {
  const known = figures.get(key);
  if (known) return known;
  const figure = domainFigure(definition);
  if (figures.size >= mostFigures) figures.clear();
  figures.set(key, figure);
  return figure;
}

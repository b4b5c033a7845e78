import { Sheet } from "@/app/components/layout/sheet";
import { typesetMath } from "@/app/components/problem/typeset-math.server";
import { Rule } from "@/app/components/scoring/rule";
import { ruleTexts } from "@/app/components/scoring/rule-texts";
import { MarginNote } from "@/app/components/ui/margin-note";
import { scorerVersion } from "@/benchmarks/scoring/scorer-version";
import type { Route } from "./+types/scoring";

export const meta: Route.MetaFunction = () => [
  { title: "Scoring · Backsight" },
  {
    name: "description",
    content: "Every definition and formula behind the figures, with its published source.",
  },
];

export const handle = { titleBlock: () => ({ label: "Sheet", value: "Scoring rules", norm: "all" }) };

export function loader() {
  return ruleTexts.map((rule) => ({
    ...rule,
    formulas: rule.formulas.map(({ latex, where }) => ({
      markup: typesetMath(latex, { isDisplay: true }),
      where,
    })),
  }));
}

export default function Scoring({ loaderData: rules }: Route.ComponentProps) {
  return (
    <Sheet margin={<Contents rules={rules} />}>
      <h1>Scoring</h1>
      <div className="prose mt-3 mb-6">
        <p>
          The server, not the author, computes every figure from the files that were handed in. These are the
          definitions that it follows, scorer version {scorerVersion}; every score keeps the version that made
          it.
        </p>
      </div>
      {rules.map((rule) => (
        <Rule key={rule.id} id={rule.id} title={rule.title} formulas={rule.formulas} sources={rule.sources}>
          {rule.paragraphs.map((paragraph) => (
            <p key={paragraph}>{paragraph}</p>
          ))}
        </Rule>
      ))}
    </Sheet>
  );
}

function Contents({ rules }: { rules: { id: string; title: string }[] }) {
  return (
    <div className="sticky top-4 max-md:static">
      <nav aria-label="On this page">
        <ul className="mb-8 grid gap-1.5 text-14">
          {rules.map((rule) => (
            <li key={rule.id}>
              <a href={`#${rule.id}`}>{rule.title}</a>
            </li>
          ))}
        </ul>
      </nav>
      <MarginNote>
        Sources are stated from memory of the publications; check them before you cite them.
      </MarginNote>
    </div>
  );
}

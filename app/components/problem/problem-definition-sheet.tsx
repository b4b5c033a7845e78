import { Sheet } from "@/app/components/layout/sheet";
import { Fact, Facts } from "@/app/components/ui/facts";
import { formatDay } from "@/app/components/ui/figures";
import { Notice } from "@/app/components/ui/notice";
import { DomainDrawing } from "./domain-drawing";
import { Formula } from "./formula";
import { GivenNumbers } from "./given-numbers";
import type { ProblemPage } from "./problem-page";
import { dimensionText, endText, smoothnessText } from "./problem-words";
import { ProofLedger } from "./proof-ledger";

/** Statement, drawing, given numbers and proof. */
export function ProblemDefinitionSheet({ page, records }: { page: ProblemPage; records: number }) {
  const { definition } = page;
  return (
    <Sheet className="!pt-0" margin={<ProblemFacts page={page} records={records} />}>
      {page.isCurrent ? null : (
        <Notice tone="warn">
          Revision {page.revision} is retired. <a href={`/problems/${page.slug}`}>The current revision</a>{" "}
          carries the ranking.
        </Notice>
      )}
      <div className="ttl">
        <div>
          <h1>{page.title}</h1>
          <div className="prose">
            <p>{definition.statement}</p>
          </div>
          <dl className="mrows">
            {page.rows.map((row) => (
              <div key={row.label}>
                <dt>{row.label}</dt>
                <dd>
                  {row.formulas.map((markup) => (
                    <Formula key={markup} markup={markup} isBlock />
                  ))}
                </dd>
              </div>
            ))}
          </dl>
        </div>
        <DomainDrawing figure={page.figure} intervals={page.intervals} />
      </div>
      <div className="two pt-6">
        <GivenNumbers numbers={page.numbers} />
        {page.proof ? <ProofLedger proof={page.proof} sources={definition.sources} /> : null}
      </div>
    </Sheet>
  );
}

function ProblemFacts({ page, records }: { page: ProblemPage; records: number }) {
  const { classification, axes, boundaryConditions } = page.definition;
  return (
    <>
      <p className="no">{page.code}</p>
      <Facts>
        <Fact label="Dimension">{dimensionText(classification)}</Fact>
        <Fact label="Kind">{classification.isLinear ? "linear" : "nonlinear"}</Fact>
        {axes.flatMap((axis) =>
          axis.kind === "periodic" ? (
            <Fact key={axis.name} label={axes.length > 1 ? `Along ${axis.name}` : "Ends"}>
              periodic
            </Fact>
          ) : (
            [
              <Fact key={`${axis.name}a`} label={axes.length > 1 ? `Low ${axis.name}` : "Left end"}>
                {endText(axis, "a", boundaryConditions)}
              </Fact>,
              <Fact key={`${axis.name}b`} label={axes.length > 1 ? `High ${axis.name}` : "Right end"}>
                {endText(axis, "b", boundaryConditions)}
              </Fact>,
            ]
          ),
        )}
        <Fact label="Solution">{smoothnessText(classification)}</Fact>
        <Fact label="Revision">
          {page.revision}
          {page.publishedAt ? `, ${formatDay(page.publishedAt)}` : ""}
        </Fact>
        <Fact label="Records">{records}</Fact>
      </Facts>
    </>
  );
}

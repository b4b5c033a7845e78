import { FamilyMark } from "@/app/components/ui/family-mark";
import { familyNames } from "@/app/components/ui/family-names";
import { formatCount } from "@/app/components/ui/figures";
import type { ProblemSummary } from "@/app/features/problems/problem-view";
import { BoundaryGlyph } from "./boundary-glyph";
import { Formula } from "./formula";
import { boundaryText } from "./problem-words";

/** One line of a catalogue, its equation typeset. */
export interface CatalogueLine extends ProblemSummary {
  equation: string;
}

interface ProblemLedgerProps {
  id: string;
  title: string;
  remark: string;
  problems: CatalogueLine[];
}

/** The tolerance at which the catalogue quotes the best record. */
const quotedTolerance = "1e-6";

export function ProblemLedger({ id, title, remark, problems }: ProblemLedgerProps) {
  return (
    <section className="sec" aria-labelledby={id}>
      <div className="lh">
        <h2 id={id}>{title}</h2>
        <p>{remark}</p>
      </div>
      {problems.length === 0 ? (
        <p className="none">
          <b>No test problem yet</b>
          <span>The catalogue fills with the first published revision.</span>
        </p>
      ) : (
        <table className="led pl">
          <caption className="sr-only">{title}</caption>
          <thead>
            <tr>
              <th scope="col" className="w-14">
                Code
              </th>
              <th scope="col" className="w-[26%]">
                Test problem
              </th>
              <th scope="col" className="eqh w-[25%]">
                Equation
              </th>
              <th scope="col">Domain and boundary conditions</th>
              <th scope="col" className="w-32">
                Families with records
              </th>
              <th scope="col" className="num tolfig w-28">
                Fewest nodes
                <br />
                to <span className="font-figure">{quotedTolerance}</span>
              </th>
              <th scope="col" className="num w-20">
                Records
              </th>
            </tr>
          </thead>
          <tbody>
            {problems.map((problem) => (
              <ProblemLine key={problem.slug} problem={problem} />
            ))}
          </tbody>
        </table>
      )}
    </section>
  );
}

function ProblemLine({ problem }: { problem: CatalogueLine }) {
  const { slug, code, title, classification, boundaryKinds, families, best, records } = problem;
  return (
    <tr>
      <td className="fig id">{code}</td>
      <th scope="row">
        <a href={`/problems/${slug}`}>{title}</a>
      </th>
      <td className="eq">
        <Formula markup={problem.equation} />
      </td>
      <td className="dg">
        <span>
          <BoundaryGlyph classification={classification} kinds={boundaryKinds} />
          {boundaryText(classification, boundaryKinds)}
        </span>
      </td>
      <td className="fam">
        {families.map((family) => (
          <span key={family} title={familyNames[family]}>
            <FamilyMark family={family} className="mr-1" />
            <span className="sr-only">{familyNames[family]} </span>
          </span>
        ))}
      </td>
      <td className="num tolfig">
        {best ? (
          `${best.atMost ? "≤ " : ""}${formatCount(best.nodes)}`
        ) : (
          <span className="nil">{records > 0 ? "none reaches" : "—"}</span>
        )}
      </td>
      <td className="num rec">{records}</td>
    </tr>
  );
}

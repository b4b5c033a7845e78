import { FamilyMark } from "@/app/components/ui/family-mark";
import { Fact, Facts } from "@/app/components/ui/facts";
import { familyNames } from "@/app/components/ui/family-names";
import { formatDay } from "@/app/components/ui/figures";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import { SubmissionStateMark } from "./submission-states";

/** What was declared, in the margin. */
export function SubmissionFacts({ submission }: { submission: SubmissionView }) {
  const { number, solver, version, team, family, method, declaration, dataLicence, state } = submission;
  const { claim, grid, precision, reconstruction, values } = declaration;
  const kinds = [...new Set([grid.x?.kind, grid.y?.kind].filter((kind) => kind !== undefined))];
  return (
    <>
      <p className="no">S-{number}</p>
      <Facts>
        <Fact label="State">
          <span className="[&_.st]:whitespace-normal">
            <SubmissionStateMark state={state} />
          </span>
        </Fact>
        <Fact label="Solver">
          {solver.name}, {version.version}
        </Fact>
        <Fact label="Team">{team.name}</Fact>
        <Fact label="Family">
          <FamilyMark family={family} className="mr-1 align-[-2px]" />
          {familyNames[family]}, {method}
        </Fact>
        <Fact label="Claim">{claim.kind === "algebraic" ? `order ${claim.order}` : claim.kind}</Fact>
        <Fact label="Grid">{kinds.join(", ")}</Fact>
        <Fact label="Values">{values === "point" ? "point values" : "cell averages"}</Fact>
        <Fact label="Between">
          {reconstruction === null
            ? "none declared"
            : "degree" in reconstruction
              ? `${reconstruction.kind}, degree ${reconstruction.degree}`
              : reconstruction.kind}
        </Fact>
        <Fact label="Precision">{precision === "float64" ? "double" : "single"}</Fact>
        <Fact label="Sent">{formatDay(submission.createdAt)}</Fact>
        <Fact label="Licence">{dataLicence}</Fact>
        <Fact label="Scorer">{submission.scorerVersion ?? "not scored yet"}</Fact>
      </Facts>
    </>
  );
}

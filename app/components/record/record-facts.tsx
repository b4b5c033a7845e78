import { formalOrderText } from "@/app/components/instrument/ranking-words";
import { Fact, Facts } from "@/app/components/ui/facts";
import { FamilyMark } from "@/app/components/ui/family-mark";
import { familyNames } from "@/app/components/ui/family-names";
import { formatRecordNumber } from "@/app/components/ui/figures";
import { StateMark } from "@/app/components/ui/state-mark";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import { submissionMarks, submissionStateNames } from "./state-words";

/** The margin of a record, or of a submission that is not one yet. */
export function RecordFacts({ view }: { view: SubmissionView }) {
  const { declaration } = view;
  const grids = Object.entries(declaration.grid).map(([axis, grid]) => ({ axis, kind: grid.kind }));
  const isSame = grids.every((grid) => grid.kind === grids[0].kind);
  return (
    <>
      <p className="no">{view.record ? formatRecordNumber(view.record.number) : `S-${view.number}`}</p>
      <Facts>
        <Fact label="Solver">
          {view.solver.slug}, {view.version.version}
        </Fact>
        <Fact label="Team">{view.team.name}</Fact>
        <Fact label="Family">
          <FamilyMark family={view.family} className="mr-1.5 align-[-2px]" />
          {familyNames[view.family]}
        </Fact>
        <Fact label="Method">{view.method}</Fact>
        <Fact label="Formal order">{formalOrderText(declaration.claim)}</Fact>
        {isSame && grids.length > 0 ? (
          <Fact label="Grid">{grids[0].kind}</Fact>
        ) : (
          grids.map((grid) => (
            <Fact key={grid.axis} label={`Grid, ${grid.axis}`}>
              {grid.kind}
            </Fact>
          ))
        )}
        <Fact label="Values">{declaration.values === "point" ? "point values" : "cell averages"}</Fact>
        <Fact label="Precision">{declaration.precision === "float64" ? "double" : "single"}</Fact>
        <Fact label="State">
          <StateMark state={submissionMarks[view.state]}>{submissionStateNames[view.state]}</StateMark>
        </Fact>
        <Fact label="Licence">{view.dataLicence}</Fact>
      </Facts>
    </>
  );
}

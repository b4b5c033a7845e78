import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import { StateMark } from "@/app/components/ui/state-mark";
import type { MethodFamily } from "@/drizzle/enums";
import type { StudyAnswer } from "./file-check";
import { Step } from "./step";
import { StudyChart } from "./study-chart";
import type { UploadRow } from "./upload-rows";
import type { Checked } from "./use-file-checks";

interface ScoreStepProps {
  rows: UploadRow[];
  answers: ReadonlyMap<string, Checked>;
  study: StudyAnswer | null;
  family: MethodFamily | null;
  /** The last one; null for a steady problem. */
  outputTime: number | null;
}

/** What the scorer makes of the files in this browser; the server's figures are the ones that count. */
export function ScoreStep({ rows, answers, study, family, outputTime }: ScoreStepProps) {
  const scored = rows.filter((row) => normsOf(answers.get(row.name))).length;
  return (
    <Step
      id="score"
      title="Score"
      remark="scored in this browser as soon as a file is read; nothing has been sent"
      state={
        rows.length > 0 ? (
          <StateMark state={scored === rows.length ? "ok" : "running"}>
            {`${scored} of ${rows.length} files scored`}
          </StateMark>
        ) : null
      }
    >
      {rows.length === 0 ? (
        <p className="text-14 text-ink-2">No file is chosen yet.</p>
      ) : (
        <div className="grid items-start gap-11 xl:grid-cols-[minmax(0,490px)_minmax(0,1fr)]">
          {study?.study ? (
            <StudyChart studies={[study.study]} family={family ?? "other"} outputTime={outputTime} />
          ) : (
            <div />
          )}
          <div className="grid gap-3">
            <ScoreLedger rows={rows} answers={answers} study={study} />
            <StudyFindings study={study} />
          </div>
        </div>
      )}
    </Step>
  );
}

function ScoreLedger({ rows, answers, study }: Omit<ScoreStepProps, "family" | "outputTime">) {
  return (
    <Ledger caption="Scores so far" isCaptionHidden>
      <thead>
        <tr>
          <th scope="col" className="num">
            N
          </th>
          <th scope="col" className="num">
            L2
          </th>
          <th scope="col" className="num">
            max
          </th>
          <th scope="col" className="num">
            Order of pair
          </th>
          <th scope="col">State</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => {
          const answer = answers.get(row.name);
          const norms = normsOf(answer);
          return (
            <tr key={row.name}>
              <th scope="row" className="num">
                {norms ? formatNodes(norms.n) : row.n}
              </th>
              <td className="num">
                <ErrorFigure value={norms?.relL2} />
              </td>
              <td className="num">
                <ErrorFigure value={norms?.relMax} />
              </td>
              <td className="num">{norms && row.role === "study" ? pairOrder(study, norms.n) : null}</td>
              <td>
                <ScoreState answer={answer} />
              </td>
            </tr>
          );
        })}
      </tbody>
    </Ledger>
  );
}

function ErrorFigure({ value }: { value: number | null | undefined }) {
  return value === null || value === undefined ? null : formatError(value, 3);
}

function normsOf(answer: Checked | undefined) {
  if (!answer || answer === "fault" || !answer.score) return null;
  const { n, times } = answer.score;
  const { relL2, relMax } = times[times.length - 1].nodes;
  return { n, relL2, relMax };
}

/** The order of the pair that ends at this grid. */
function pairOrder(answer: StudyAnswer | null, n: number[]): string | null {
  const study = answer?.study;
  const at = study?.points.findIndex((point) => point.n.join() === n.join()) ?? -1;
  const order = study?.pairOrders[at - 1];
  return order === undefined || !Number.isFinite(order) ? null : order.toFixed(2);
}

function ScoreState({ answer }: { answer: Checked | undefined }) {
  if (!answer) return <StateMark state="running">reading</StateMark>;
  if (answer === "fault") return <StateMark state="none">left to the server</StateMark>;
  if (answer.refusal) return <StateMark state="refused">waits for a file</StateMark>;
  if (answer.score) return <StateMark state="ok">scored</StateMark>;
  return <StateMark state="none">waits for the declaration</StateMark>;
}

function StudyFindings({ study }: { study: StudyAnswer | null }) {
  const findings = study?.findings.filter((finding) => finding.run === null) ?? [];
  if (findings.length === 0) return null;
  return (
    <ul className="grid list-none gap-1.5 p-0 text-14">
      {findings.map((finding) => (
        <li key={finding.code + finding.message} className="border-l-3 border-warn pl-3">
          {finding.message}
        </li>
      ))}
    </ul>
  );
}

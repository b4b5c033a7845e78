import { useNavigate } from "react-router";
import { Button } from "@/app/components/ui/button";
import { Field } from "@/app/components/ui/field";
import { Select } from "@/app/components/ui/select";
import { Step } from "./step";
import type { ChosenProblem } from "./submit-state";

export interface ProblemChoice {
  slug: string;
  code: string;
  title: string;
}

/** The choice stands in the address, so that a problem's page can lead here. Without a script the button makes it. */
export function ProblemStep({
  problems,
  chosen,
}: {
  problems: ProblemChoice[];
  chosen: ChosenProblem | null;
}) {
  const navigate = useNavigate();
  return (
    <Step
      id="problem"
      isFirst
      title="Problem"
      remark={chosen ? `revision ${chosen.revision}` : "what the files solve"}
    >
      <form method="get" className="grid items-end gap-x-7 sm:grid-cols-2 lg:grid-cols-3">
        <Field label="Test problem">
          <Select
            name="problem"
            value={chosen?.definition.slug ?? ""}
            onChange={(event) =>
              void navigate(`/submit?problem=${event.target.value}`, {
                replace: true,
                preventScrollReset: true,
              })
            }
          >
            {chosen ? null : <option value="">Choose a test problem</option>}
            {problems.map((problem) => (
              <option key={problem.slug} value={problem.slug}>
                {problem.code} {problem.title}
              </option>
            ))}
          </Select>
        </Field>
        <noscript>
          <Button type="submit">Use this problem</Button>
        </noscript>
        {chosen ? (
          <p className="mb-4 self-center text-14 text-ink-2">
            <a href={`/problems/${chosen.definition.slug}`}>Definition and starter kit</a>
          </p>
        ) : null}
      </form>
    </Step>
  );
}

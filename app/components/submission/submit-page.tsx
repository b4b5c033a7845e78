import { Link } from "react-router";
import { Sheet } from "@/app/components/layout/sheet";
import { Notice } from "@/app/components/ui/notice";
import { ProblemStep, type ProblemChoice } from "./problem-step";
import { refusalElementId, type SubmitRefusal } from "./send-submission";
import { StepList } from "./step-list";
import { SubmitForm } from "./submit-form";
import type { Limits } from "./submit-readiness";
import type { ChosenProblem, Team } from "./submit-state";
import { stepsOf } from "./submit-steps";
import { useSubmitForm } from "./use-submit-form";

interface SubmitPageProps {
  problems: ProblemChoice[];
  problem: ChosenProblem | null;
  teams: Team[];
  isEmailVerified: boolean;
  limits: Limits;
  refused: SubmitRefusal | undefined;
}

export function SubmitPage(props: SubmitPageProps) {
  const { problems, problem, teams, isEmailVerified, limits, refused } = props;
  if (!isEmailVerified || teams.length === 0) return <NotYet isEmailVerified={isEmailVerified} />;
  return (
    <>
      {refused ? <div id={refusalElementId} hidden data-refusal={JSON.stringify(refused)} /> : null}
      {problem ? (
        <Filled problems={problems} problem={problem} teams={teams} limits={limits} refused={refused} />
      ) : (
        <Sheet margin={<StepList steps={stepsOf(null, null)} />}>
          <Heading />
          <ProblemStep problems={problems} chosen={null} />
        </Sheet>
      )}
    </>
  );
}

type FilledProps = Omit<SubmitPageProps, "problem" | "isEmailVerified"> & { problem: ChosenProblem };

function Filled({ problems, problem, teams, limits, refused }: FilledProps) {
  const form = useSubmitForm({ problem, teams, limits, refused });
  return (
    <Sheet margin={<StepList steps={stepsOf(problem, form)} />}>
      <Heading />
      <ProblemStep problems={problems} chosen={problem} />
      <SubmitForm problem={problem} teams={teams} limits={limits} form={form} />
    </Sheet>
  );
}

function Heading() {
  return <h1 className="mb-6 text-34">Hand in a refinement study</h1>;
}

function NotYet({ isEmailVerified }: { isEmailVerified: boolean }) {
  return (
    <Sheet margin={null}>
      <Heading />
      <Notice tone="warn">
        {isEmailVerified ? (
          <>
            A submission belongs to a team, and you are in none. <Link to="/account/teams">Make a team</Link>{" "}
            first.
          </>
        ) : (
          <>
            Your address is not verified yet. Follow the link in the mail, or ask for a new one on{" "}
            <Link to="/account">your account page</Link>.
          </>
        )}
      </Notice>
    </Sheet>
  );
}

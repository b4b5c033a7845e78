import { ProblemLedger } from "@/app/components/problem/problem-ledger";
import { typesetMath } from "@/app/components/problem/typeset-math.server";
import { listProblems } from "@/app/features/problems/list-problems.server";
import { answerPage } from "@/app/http/answers.server";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Test problems · Backsight" }];

export const handle = { titleBlock: () => ({ label: "Sheet", value: "All test problems" }) };

export async function loader({ request }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const problems = await listProblems();
    return problems.map((problem) => ({ ...problem, equation: typesetMath(problem.equationsLatex) }));
  });
}

export default function Problems({ loaderData: problems }: Route.ComponentProps) {
  const of = (domain: string) => problems.filter((problem) => problem.classification.domain === domain);
  return (
    <>
      <div className="pt-8">
        <h1>Test problems</h1>
        <div className="prose mt-3">
          <p>
            Each has an exact solution that is proven consistent with its equation and conditions before a
            revision is published. Nodes are those that the best listed record needs.
          </p>
        </div>
      </div>
      <ProblemLedger
        id="periodic"
        title="Periodic domains"
        remark="one period, equally spaced nodes"
        problems={of("periodic")}
      />
      <ProblemLedger
        id="bounded"
        title="Bounded domains"
        remark="Dirichlet, Neumann and Robin conditions"
        problems={of("bounded")}
      />
    </>
  );
}

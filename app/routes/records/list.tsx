import { RecordLedger } from "@/app/components/record/record-ledger";
import { Pagination } from "@/app/components/ui/pagination";
import { listRecords } from "@/app/features/submissions/list-submissions.server";
import { answerPage } from "@/app/http/answers.server";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Records · Backsight" }];

export const handle = { titleBlock: () => ({ label: "Sheet", value: "Records" }) };

export async function loader({ request }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const cursor = new URL(request.url).searchParams.get("cursor");
    return { ...(await listRecords({ cursor })), isFirst: cursor === null };
  });
}

export default function Records({ loaderData: { items, nextCursor, isFirst } }: Route.ComponentProps) {
  return (
    <>
      <div className="pt-8 pb-6">
        <h1>Records</h1>
        <div className="prose mt-3">
          <p>
            Listed submissions, the latest first. Each leads to its files, checksums and the scorer’s version.
          </p>
        </div>
      </div>
      {items.length === 0 ? (
        <p className="none">
          <b>No record yet</b>
          <span>A submission stands here once an admin has listed it.</span>
        </p>
      ) : (
        <>
          <RecordLedger records={items} />
          <Pagination
            firstHref={isFirst ? null : "/records"}
            nextHref={nextCursor ? `/records?cursor=${encodeURIComponent(nextCursor)}` : null}
          >
            {items.length === 1 ? "1 record on this page" : `${items.length} records on this page`}
          </Pagination>
        </>
      )}
    </>
  );
}

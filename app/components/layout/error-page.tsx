import { isRouteErrorResponse } from "react-router";
import { RefusalBox } from "@/app/components/ui/refusal-box";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import { Sheet } from "./sheet";

interface Said {
  title: string;
  detail: string;
  refusals: Refusal[];
  retryAfterSeconds: number | null;
}

const outage: Said = {
  title: "The page could not be made",
  detail: "The fault lies with the server, and it is logged. Nothing that you sent before this page is lost.",
  refusals: [],
  retryAfterSeconds: null,
};

/** What a page shows in place of itself: the status as a number, what was found, and where to go. */
export function ErrorPage({ error }: { error: unknown }) {
  const status = isRouteErrorResponse(error) ? error.status : 500;
  const said = saidBy(error, status);
  return (
    <Sheet margin={<p className="no">{status}</p>}>
      <title>{`${said.title} · Backsight`}</title>
      <h1>{said.title}</h1>
      <div className="prose mt-4">
        <p>{said.detail}</p>
        {said.retryAfterSeconds === null ? null : <p>Try again in {said.retryAfterSeconds} seconds.</p>}
      </div>
      <RefusalBox refusals={said.refusals} />
      <p className="mt-4 flex flex-wrap gap-6">
        <a href="/">Home</a>
        <a href="/problems">Test problems</a>
        <a href="/records">Records</a>
      </p>
    </Sheet>
  );
}

function saidBy(error: unknown, status: number): Said {
  if (!isRouteErrorResponse(error)) return outage;
  if (isSaid(error.data)) return error.data;
  if (status === 404) {
    return {
      ...outage,
      title: "No such page",
      detail:
        "Nothing public stands at this address. The address of a record is /records/ with its number and version.",
    };
  }
  if (status === 405) {
    return { ...outage, title: "Not allowed", detail: "This address cannot be written to in this way." };
  }
  return status < 500 ? { ...outage, title: "Refused", detail: error.statusText } : outage;
}

function isSaid(value: unknown): value is Said {
  return (
    typeof value === "object" &&
    value !== null &&
    "title" in value &&
    "detail" in value &&
    "refusals" in value &&
    "retryAfterSeconds" in value
  );
}

import type { TitleBlockEntry } from "@/app/components/layout/title-block";
import { AuditLogPage } from "@/app/components/moderation/audit-log-page";
import { parseAuditLogQuery } from "@/app/features/moderation/audit-log-query";
import { listAuditActions, listAuditLog } from "@/app/features/moderation/list-audit-log.server";
import { answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/log";

export const meta: Route.MetaFunction = () => [{ title: "Audit log · Backsight" }];

export const handle = {
  titleBlock: (): TitleBlockEntry => ({ label: "Sheet", value: "Audit log" }),
};

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const viewer = context.get(viewerContext);
    const query = parseAuditLogQuery(new URL(request.url).searchParams);
    const [log, actions] = await Promise.all([listAuditLog(viewer, query), listAuditActions(viewer)]);
    return { query, log, actions };
  });
}

export default function AuditLog({ loaderData }: Route.ComponentProps) {
  return <AuditLogPage {...loaderData} />;
}

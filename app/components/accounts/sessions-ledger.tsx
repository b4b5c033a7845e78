import { StateMark } from "@/app/components/ui/state-mark";
import { Ledger } from "@/app/components/ui/ledger";
import type { SessionItem } from "@/app/features/accounts/sessions.server";
import { browserOf } from "./browser-of";
import { Moment } from "./moment";

export function SessionsLedger({ sessions }: { sessions: SessionItem[] }) {
  return (
    <Ledger caption="Browsers that are signed in">
      <thead>
        <tr>
          <th scope="col">Browser</th>
          <th scope="col">Signed in</th>
          <th scope="col">Last seen</th>
          <th scope="col">Ends</th>
          <th scope="col">State</th>
        </tr>
      </thead>
      <tbody>
        {sessions.map((session) => (
          <tr key={session.createdAt.toISOString()}>
            <th scope="row">{browserOf(session.userAgent)}</th>
            <td>
              <Moment at={session.createdAt} />
            </td>
            <td>
              <Moment at={session.lastSeenAt} />
            </td>
            <td>
              <Moment at={session.expiresAt} />
            </td>
            <td>{session.isCurrent ? <StateMark state="listed">this browser</StateMark> : "another"}</td>
          </tr>
        ))}
      </tbody>
    </Ledger>
  );
}

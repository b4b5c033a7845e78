import { Ledger } from "@/app/components/ui/ledger";
import type { TeamItem } from "@/app/features/teams/list-teams.server";
import { Moment } from "./moment";

export function TeamsLedger({ teams }: { teams: TeamItem[] }) {
  if (teams.length === 0) return <p>You belong to no team. Make one to hand in for it.</p>;
  return (
    <Ledger caption="Teams that you belong to">
      <thead>
        <tr>
          <th scope="col">Team</th>
          <th scope="col">Address</th>
          <th scope="col">You are</th>
          <th scope="col" className="num">
            People
          </th>
          <th scope="col">Made</th>
        </tr>
      </thead>
      <tbody>
        {teams.map((team) => (
          <tr key={team.id}>
            <th scope="row">{team.name}</th>
            <td>
              <code>{team.slug}</code>
            </td>
            <td>{team.role}</td>
            <td className="num">{team.members}</td>
            <td>
              <Moment at={team.createdAt} />
            </td>
          </tr>
        ))}
      </tbody>
    </Ledger>
  );
}

import { Form } from "react-router";
import { Button } from "@/app/components/ui/button";
import { Ledger } from "@/app/components/ui/ledger";
import { StateMark } from "@/app/components/ui/state-mark";
import type { ApiKeyItem } from "@/app/features/api-keys/list-api-keys.server";
import { Moment } from "./moment";

export function ApiKeysLedger({ keys }: { keys: ApiKeyItem[] }) {
  if (keys.length === 0) return <p>You hold no token.</p>;
  return (
    <Ledger caption="Tokens that are not revoked">
      <thead>
        <tr>
          <th scope="col">Name</th>
          <th scope="col">Begins</th>
          <th scope="col">Scopes</th>
          <th scope="col">Made</th>
          <th scope="col">Expires</th>
          <th scope="col">Last used</th>
          <th scope="col">Revoke</th>
        </tr>
      </thead>
      <tbody>
        {keys.map((key) => (
          <tr key={key.id}>
            <th scope="row">{key.name}</th>
            <td>
              <code>{key.prefix}</code>
            </td>
            <td>{key.scopes.join(", ")}</td>
            <td>
              <Moment at={key.createdAt} />
            </td>
            <td>
              <Expiry apiKey={key} />
            </td>
            <td>{key.lastUsedAt === null ? "never" : <Moment at={key.lastUsedAt} />}</td>
            <td>
              <Revoke id={key.id} name={key.name} />
            </td>
          </tr>
        ))}
      </tbody>
    </Ledger>
  );
}

function Expiry({ apiKey }: { apiKey: ApiKeyItem }) {
  if (apiKey.expiresAt === null) return "never";
  if (apiKey.isExpired) return <StateMark state="withdrawn">expired</StateMark>;
  return <Moment at={apiKey.expiresAt} />;
}

/** Asks once more without a script: the disclosure opens the question. */
function Revoke({ id, name }: { id: string; name: string }) {
  return (
    <details>
      <summary>
        Revoke<span className="sr-only"> {name}</span>
      </summary>
      <Form method="post" action="?revoke" className="pt-2">
        <input type="hidden" name="id" value={id} />
        <p className="pb-2 text-13">
          Calls with this token are refused from then on. It cannot be taken back.
        </p>
        <Button type="submit" variant="danger">
          Revoke {name}
        </Button>
      </Form>
    </details>
  );
}

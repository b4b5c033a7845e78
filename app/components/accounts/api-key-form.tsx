import { Button } from "@/app/components/ui/button";
import { Checkbox } from "@/app/components/ui/checkbox";
import { Field } from "@/app/components/ui/field";
import { Select } from "@/app/components/ui/select";
import { proposedLifetimesDays } from "@/app/features/api-keys/api-key-form";
import type { ApiScope } from "@/drizzle/enums";
import { AccountForm } from "./account-form";
import { FormField } from "./form-field";
import type { Refusal } from "./refusal";

const meanings: Record<ApiScope, string> = {
  read: "read, also what only your teams see",
  submit: "submit, amend and hand in",
  curate: "curate test problems",
  review: "review, list and return",
};

const proposedScopes: ApiScope[] = ["read", "submit"];

export function ApiKeyForm({ scopes, refusal }: { scopes: ApiScope[]; refusal: Refusal | undefined }) {
  const ticked: string[] = refusal ? (refusal.values.scopes ?? "").split(",") : proposedScopes;
  return (
    <AccountForm refusal={refusal}>
      <FormField
        name="name"
        label="Name"
        autoComplete="off"
        hint="What will use it, so that you know which one to revoke."
        refusal={refusal}
      />
      <fieldset aria-describedby={refusal?.fields.scopes ? "scopes-error" : undefined}>
        <legend>Scopes</legend>
        {scopes.map((scope) => (
          <Checkbox key={scope} name="scopes" value={scope} defaultChecked={ticked.includes(scope)}>
            {meanings[scope]}
          </Checkbox>
        ))}
        {refusal?.fields.scopes ? <p id="scopes-error">{refusal.fields.scopes}</p> : null}
      </fieldset>
      <Field label="Expires" error={refusal?.fields.expiresInDays}>
        <Select name="expiresInDays" defaultValue={refusal?.values.expiresInDays ?? "90"}>
          {proposedLifetimesDays.map((days) => (
            <option key={days} value={days}>
              after {days} days
            </option>
          ))}
          <option value="never">never</option>
        </Select>
      </Field>
      <Button type="submit" variant="primary">
        Make the token
      </Button>
    </AccountForm>
  );
}

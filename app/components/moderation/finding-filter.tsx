import { Form, useSubmit } from "react-router";
import { Button } from "@/app/components/ui/button";
import { Select } from "@/app/components/ui/select";
import { noFinding, type ModerationQuery } from "@/app/features/moderation/moderation-query";
import { findingName } from "./finding-names";

/** Filters as soon as a finding is chosen; without a script by the button. */
export function FindingFilter({ query, codes }: { query: ModerationQuery; codes: string[] }) {
  const submit = useSubmit();
  return (
    <Form method="get" className="ml-auto flex items-end gap-2 max-md:ml-0 max-md:w-full">
      {query.tab === "waiting" ? null : <input type="hidden" name="tab" value={query.tab} />}
      <label className="block max-md:w-full">
        <span className="mb-0.5 block text-12 font-medium text-ink-2">Finding</span>
        <Select
          name="finding"
          value={query.finding ?? ""}
          onChange={(event) => void submit(event.currentTarget.form, { replace: true })}
        >
          <option value="">any finding</option>
          {codes.map((code) => (
            <option key={code} value={code}>
              {findingName(code)}
            </option>
          ))}
          <option value={noFinding}>none</option>
        </Select>
      </label>
      <noscript>
        <Button type="submit">Filter</Button>
      </noscript>
    </Form>
  );
}

import type { ChangeEvent, FormEvent, ReactNode } from "react";
import { Form, useSubmit } from "react-router";
import { normParameterOf } from "@/app/features/rankings/ranking-query";
import type { RankingView } from "@/app/features/rankings/ranking-view";

/** The address is the state: every control is a field of one GET form, sent at once where scripts run. */
export function InstrumentForm({ view, children }: { view: RankingView; children: ReactNode }) {
  const { norm, measure, by } = view.query;
  const submit = useSubmit();
  const send = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const search = new URLSearchParams();
    for (const [name, value] of new FormData(event.currentTarget)) {
      if (typeof value === "string" && value.trim() !== "") search.append(name, value.trim());
    }
    void submit(search, { method: "get", replace: true, preventScrollReset: true });
  };
  return (
    <Form method="get" onSubmit={send} onChange={sendChoice}>
      {norm === "relL2" ? null : <input type="hidden" name="norm" value={normParameterOf[norm]} />}
      {measure === "nodes" ? null : <input type="hidden" name="measure" value={measure} />}
      {by === "nodes" ? null : <input type="hidden" name="by" value={by} />}
      {children}
    </Form>
  );
}

function sendChoice({ target, currentTarget: form }: ChangeEvent<HTMLFormElement>) {
  const element: EventTarget = target;
  const isChoice =
    element instanceof HTMLSelectElement ||
    (element instanceof HTMLInputElement && element.type === "checkbox");
  // The controls must first be drawn with what was chosen.
  if (isChoice) setTimeout(() => form.requestSubmit());
}

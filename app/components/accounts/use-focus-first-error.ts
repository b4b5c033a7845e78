import { type RefObject, useEffect, useRef } from "react";

/** After a refused form arrives, puts the focus into its first wrong field. */
export function useFocusFirstError(refusal: unknown): RefObject<HTMLFormElement | null> {
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (refusal) form.current?.querySelector<HTMLElement>("[aria-invalid=true], [role=alert]")?.focus();
  }, [refusal]);
  return form;
}

import type { ReactNode } from "react";
import { Form } from "react-router";
import { Notice } from "@/app/components/ui/notice";
import type { Refusal } from "./refusal";
import { useFocusFirstError } from "./use-focus-first-error";

interface AccountFormProps {
  refusal: Refusal | undefined;
  children: ReactNode;
}

/** Posts to its own page. The server's sentences are shown rather than the browser's. */
export function AccountForm({ refusal, children }: AccountFormProps) {
  const form = useFocusFirstError(refusal);
  return (
    <Form method="post" noValidate ref={form} className="max-w-[392px] max-sm:max-w-none">
      {refusal?.message ? <Notice tone="bad">{refusal.message}</Notice> : null}
      {children}
    </Form>
  );
}

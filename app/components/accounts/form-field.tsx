import { Field } from "@/app/components/ui/field";
import { TextInput } from "@/app/components/ui/text-input";
import type { Refusal } from "./refusal";

interface FormFieldProps {
  name: string;
  label: string;
  autoComplete: string;
  type?: "text" | "email" | "password";
  hint?: string;
  refusal: Refusal | undefined;
}

/** A text field with what is wrong with it below, and what was given in it. */
export function FormField({ name, label, autoComplete, type = "text", hint, refusal }: FormFieldProps) {
  const error = refusal?.fields[name];
  return (
    <Field label={label} hint={hint} error={error}>
      <TextInput
        name={name}
        type={type}
        autoComplete={autoComplete}
        defaultValue={refusal?.values[name]}
        // Without JavaScript the browser itself puts the focus into the first wrong field.
        autoFocus={error !== undefined && Object.keys(refusal?.fields ?? {})[0] === name}
        required
      />
    </Field>
  );
}

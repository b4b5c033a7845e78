import { createContext, type ReactNode, use, useId } from "react";

interface FieldTie {
  id: string;
  describedBy: string | undefined;
  isInvalid: boolean;
}

const FieldContext = createContext<FieldTie | null>(null);

interface FieldProps {
  label: ReactNode;
  hint?: ReactNode;
  /** What to give instead; shown in place of the hint. */
  error?: string;
  className?: string;
  /** One control. */
  children: ReactNode;
}

/** Label above, control, hint or error below; the control finds its ties by itself. */
export function Field({ label, hint, error, className, children }: FieldProps) {
  const id = useId();
  const noteId = `${id}-note`;
  const tie = { id, describedBy: error || hint ? noteId : undefined, isInvalid: Boolean(error) };
  return (
    <div className={`fld ${className ?? ""}`}>
      <label htmlFor={id}>{label}</label>
      <FieldContext value={tie}>{children}</FieldContext>
      {error ? (
        <p id={noteId} className="e">
          {error}
        </p>
      ) : hint ? (
        <p id={noteId} className="h">
          {hint}
        </p>
      ) : null}
    </div>
  );
}

/** What a control takes over from the field that it stands in; empty outside one. */
export function useFieldTie() {
  const tie = use(FieldContext);
  if (!tie) return {};
  return {
    id: tie.id,
    "aria-describedby": tie.describedBy,
    "aria-invalid": tie.isInvalid ? true : undefined,
  };
}

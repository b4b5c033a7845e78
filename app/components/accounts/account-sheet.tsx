import type { ReactNode } from "react";
import { Sheet } from "@/app/components/layout/sheet";

interface AccountSheetProps {
  title: string;
  /** Stand in the margin column. */
  notes: string[];
  nav?: ReactNode;
  children: ReactNode;
}

export function AccountSheet({ title, notes, nav, children }: AccountSheetProps) {
  return (
    <Sheet
      margin={notes.map((note) => (
        <p key={note} className="note">
          {note}
        </p>
      ))}
    >
      <h1>{title}</h1>
      {nav}
      {children}
    </Sheet>
  );
}

import type { ReactNode } from "react";

interface FactsProps {
  isWide?: boolean;
  children: ReactNode;
}

export function Facts({ isWide = false, children }: FactsProps) {
  return <dl className={isWide ? "facts wide" : "facts"}>{children}</dl>;
}

export function Fact({ label, children }: { label: ReactNode; children: ReactNode }) {
  return (
    <div>
      <dt>{label}</dt>
      <dd>{children}</dd>
    </div>
  );
}

import type { ComponentProps } from "react";

/** The children are the label. */
export function Checkbox({ children, className, ...rest }: ComponentProps<"input">) {
  return (
    <label className={`ck ${className ?? ""}`}>
      <input type="checkbox" {...rest} />
      {children}
    </label>
  );
}

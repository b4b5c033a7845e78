import type { ComponentProps } from "react";

/** The children are the label. */
export function Radio({ children, className, ...rest }: ComponentProps<"input">) {
  return (
    <label className={`ck ${className ?? ""}`}>
      <input type="radio" {...rest} />
      {children}
    </label>
  );
}

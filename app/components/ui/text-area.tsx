import type { ComponentProps } from "react";
import { useFieldTie } from "./field";

export function TextArea({ className, ...rest }: ComponentProps<"textarea">) {
  return <textarea {...useFieldTie()} className={`in ${className ?? ""}`} {...rest} />;
}

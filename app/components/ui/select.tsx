import type { ComponentProps } from "react";
import { useFieldTie } from "./field";

export function Select({ className, ...rest }: ComponentProps<"select">) {
  return <select {...useFieldTie()} className={`in ${className ?? ""}`} {...rest} />;
}

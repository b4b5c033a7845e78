import type { ComponentProps } from "react";
import { useFieldTie } from "./field";

export function TextInput({ className, type = "text", ...rest }: ComponentProps<"input">) {
  return <input {...useFieldTie()} type={type} className={`in ${className ?? ""}`} {...rest} />;
}

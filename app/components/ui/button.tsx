import type { ComponentProps } from "react";

export type ButtonVariant = "plain" | "primary" | "danger" | "text";

const looks: Record<ButtonVariant, string> = {
  plain: "btn",
  primary: "btn pri",
  danger: "btn bad",
  text: "txtb",
};

interface ButtonProps extends ComponentProps<"button"> {
  /** One primary button a view. */
  variant?: ButtonVariant;
}

export function Button({ variant = "plain", className, ...rest }: ButtonProps) {
  return <button className={`${looks[variant]} ${className ?? ""}`} {...rest} />;
}

interface ButtonLinkProps extends ComponentProps<"a"> {
  variant?: ButtonVariant;
}

/** Looks like a button and leads somewhere. */
export function ButtonLink({ variant = "plain", className, ...rest }: ButtonLinkProps) {
  return <a className={`${looks[variant]} ${className ?? ""}`} {...rest} />;
}

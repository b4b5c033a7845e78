import { z } from "zod";
import { passwordLength, passwordRefusal } from "./password-rules";

/** Lower case, as it is stored and compared. */
export const emailField = z
  .string({ error: "Give your e-mail address." })
  .trim()
  .toLowerCase()
  .min(1, "Give your e-mail address.")
  .max(254, "An e-mail address has at most 254 characters.")
  .pipe(z.email("This is not an e-mail address. Give one such as name@example.org."));

const nameField = z
  .string({ error: "Give the name that your records shall show." })
  .trim()
  .min(1, "Give the name that your records shall show.")
  .max(120, "A name has at most 120 characters.");

const newPasswordField = z
  .string({ error: "Choose a password." })
  .min(passwordLength.min, `Use at least ${passwordLength.min} characters.`)
  .max(passwordLength.max, `Use at most ${passwordLength.max} characters.`);

export const joinForm = z
  .object({ name: nameField, email: emailField, password: newPasswordField })
  .superRefine((input, context) => {
    const refusal = passwordRefusal(input.password, input);
    if (refusal !== null) context.addIssue({ code: "custom", path: ["password"], message: refusal });
  });
export type JoinInput = z.infer<typeof joinForm>;

export const signInForm = z.object({
  email: emailField,
  // No minimum: the rule for new passwords says nothing about one chosen before it.
  password: z.string({ error: "Give your password." }).min(1, "Give your password.").max(passwordLength.max),
});
export type SignInInput = z.infer<typeof signInForm>;

export const forgotForm = z.object({ email: emailField });

export const resetForm = z.object({ password: newPasswordField });

export const passwordLength = { min: 12, max: 256 };

/** Why a password is refused for its owner; null where it is not. Length is the only rule of composition. */
export function passwordRefusal(password: string, owner: { name: string; email: string }): string | null {
  const folded = fold(password);
  const known = [owner.email, owner.email.split("@")[0], owner.name].map(fold);
  if (known.includes(folded)) return "The password is your name or e-mail address. Choose another.";
  return null;
}

function fold(text: string): string {
  return text.normalize("NFKC").toLowerCase().replace(/\s+/g, "");
}

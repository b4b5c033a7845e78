/** A refused form as an action answers it. */
export interface Refusal {
  /** About the whole form. */
  message: string | null;
  /** A sentence for each wrong field. */
  fields: Record<string, string>;
  /** What was given, to fill the form again. */
  values: Record<string, string>;
}

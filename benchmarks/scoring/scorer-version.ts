/**
 * Version of the scorer, stored with every score.
 *
 * A change that can move any number by more than 1e-13 relative raises it.
 *
 * @example scorerVersion // "1.0.0"
 * @see the page /scoring
 */
export const scorerVersion = "1.0.0";

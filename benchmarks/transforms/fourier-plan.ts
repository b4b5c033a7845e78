/** Complex values as two arrays of the same length. */
export interface ComplexArray {
  re: Float64Array;
  im: Float64Array;
}

/** Transforms of one length, with what they need computed once. */
export interface FourierPlan {
  /** The forward transform; the arguments are left as they are. */
  forward(re: Float64Array, im: Float64Array): ComplexArray;
}

/** The tree of an expression after the check against the allow-list; offsets count from 0. */
export type ExpressionNode =
  | { kind: "number"; value: number; text: string }
  | { kind: "name"; name: string; at: number }
  | { kind: "call"; name: string; args: ExpressionNode[]; at: number }
  | { kind: "negative"; arg: ExpressionNode }
  | { kind: "arithmetic"; sign: ArithmeticSign; left: ExpressionNode; right: ExpressionNode }
  | { kind: "comparison"; sign: ComparisonSign; left: ExpressionNode; right: ExpressionNode }
  | { kind: "conditional"; test: ExpressionNode; then: ExpressionNode; otherwise: ExpressionNode };

export type ArithmeticSign = "+" | "-" | "*" | "/" | "^";
export type ComparisonSign = "<" | ">" | "<=" | ">=" | "==" | "!=";

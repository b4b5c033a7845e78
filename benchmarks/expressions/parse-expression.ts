import { create, parseDependencies } from "mathjs";
import type { MathNode } from "mathjs";

import { functionArity } from "./allowed-names";
import type { ArithmeticSign, ComparisonSign, ExpressionNode } from "./expression-node";
import { refuseAt, scanExpression, type ScanNames, type Token } from "./scan-expression";

const { parse } = create({ parseDependencies });

const arithmeticSigns: readonly string[] = ["+", "-", "*", "/", "^"];
const comparisonSigns: readonly string[] = ["<", ">", "<=", ">=", "==", "!="];

/**
 * Parse an expression and check its tree against the allow-list.
 *
 * Only numbers, declared names, + - * / ^, comparisons, `cond ? a : b` and the listed functions pass: no
 * assignment, no property access, no strings, no functions of the user's own.
 *
 * @param text the expression
 * @param names what may be named
 * @returns the checked tree
 * @throws DataError `expression/...`, `where` naming the character from 1
 * @example parseExpression("2*x", names)
 * @see mathjs, expression parsing, https://mathjs.org/docs/expressions/parsing.html
 */
export function parseExpression(text: string, names: ScanNames): ExpressionNode {
  const tokens = scanExpression(text, names);
  const identifiers = tokens.filter((token) => token.kind === "name");
  return new TreeCheck(identifiers).check(parseOrRefuse(text));
}

function parseOrRefuse(text: string): MathNode {
  try {
    return parse(text);
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    const place = "char" in error && typeof error.char === "number" ? error.char - 1 : 0;
    const reason = error.message.replace(/ \(char \d+\)$/, "");
    refuseAt("syntax", `The expression cannot be read here: ${reason}.`, Math.min(place, text.length));
  }
}

/** The library's tree has no positions; its names come in the order of the text, so they are counted off. */
class TreeCheck {
  private next = 0;

  constructor(private readonly identifiers: Token[]) {}

  check(node: MathNode): ExpressionNode {
    switch (node.type) {
      case "ParenthesisNode":
        return this.check((node as unknown as { content: MathNode }).content);
      case "ConstantNode":
        return this.checkConstant((node as unknown as { value: unknown }).value);
      case "SymbolNode":
        return { kind: "name", name: this.take(), at: this.identifiers[this.next - 1].at };
      case "FunctionNode":
        return this.checkCall((node as unknown as { args: MathNode[] }).args);
      case "OperatorNode":
        return this.checkOperator(node as unknown as { op: string; args: MathNode[] });
      case "ConditionalNode":
        return this.checkConditional(node as unknown as ConditionalParts);
      case "RelationalNode":
        return refuseAt(
          "syntax",
          "Comparisons cannot be chained; multiply two comparisons instead.",
          this.place(),
        );
      default:
        return refuseAt("not-allowed", `A ${node.type} is not allowed in an expression.`, this.place());
    }
  }

  private checkConstant(value: unknown): ExpressionNode {
    if (typeof value !== "number")
      refuseAt("not-allowed", "Only numbers are allowed as constants.", this.place());
    return { kind: "number", value, text: String(value) };
  }

  private checkCall(args: MathNode[]): ExpressionNode {
    const name = this.take();
    const at = this.identifiers[this.next - 1].at;
    const [fewest, most] = name === "d" ? [2, 2] : (functionArity.get(name) ?? [0, 0]);
    if (args.length < fewest || args.length > most) {
      const expected = fewest === most ? `${fewest}` : `${fewest} to ${most}`;
      refuseAt("arguments", `The function ${name} takes ${expected} arguments; it has ${args.length}.`, at);
    }
    return { kind: "call", name, args: args.map((arg) => this.check(arg)), at };
  }

  private checkOperator({ op, args }: { op: string; args: MathNode[] }): ExpressionNode {
    if (args.length === 1 && op === "-") return { kind: "negative", arg: this.check(args[0]) };
    if (args.length === 1 && op === "+") return this.check(args[0]);
    if (args.length === 2 && arithmeticSigns.includes(op)) {
      const left = this.check(args[0]);
      return { kind: "arithmetic", sign: op as ArithmeticSign, left, right: this.check(args[1]) };
    }
    if (args.length === 2 && comparisonSigns.includes(op)) {
      const left = this.check(args[0]);
      return { kind: "comparison", sign: op as ComparisonSign, left, right: this.check(args[1]) };
    }
    return refuseAt("not-allowed", `The operator ${op} is not allowed in an expression.`, this.place());
  }

  private checkConditional(node: ConditionalParts): ExpressionNode {
    const test = this.check(node.condition);
    const then = this.check(node.trueExpr);
    return { kind: "conditional", test, then, otherwise: this.check(node.falseExpr) };
  }

  private take(): string {
    const token = this.identifiers[this.next];
    this.next += 1;
    return token.text;
  }

  private place(): number {
    return this.identifiers[Math.max(0, this.next - 1)]?.at ?? 0;
  }
}

interface ConditionalParts {
  condition: MathNode;
  trueExpr: MathNode;
  falseExpr: MathNode;
}

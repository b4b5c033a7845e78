import { DataError } from "../scoring/data-error";
import { isReservedName } from "./allowed-names";
import { ComplexArithmetic, type ComplexValue } from "./complex-arithmetic";
import type { ExpressionNode } from "./expression-node";
import { type BinaryName, isUnary, type Operation, type UnaryName } from "./operation";
import { OperationList } from "./operation-list";
import { parseExpression } from "./parse-expression";

export interface ExpressionContext {
  /** Names of the axes in the grid's order; each changes along its own axis alone. */
  axes: readonly string[];
  /** Names that have one value for a whole grid: t and the parameters. */
  scalars: readonly string[];
  /** Names that have a value at every node, such as u and its derivatives. */
  fields?: readonly string[];
  /** Texts of named expressions, put in where their names occur. */
  named?: Readonly<Record<string, string>>;
  /** Fields that are complex; i, re, im and conj are known where any is, or where `isComplex` is set. */
  complexFields?: readonly string[];
  isComplex?: boolean;
  /** Axes and t along which d(expression, axis) may differentiate; absent: d is unknown. */
  derivatives?: readonly string[];
}

/** An expression as a flat list of steps; the outputs are indices of steps. */
export interface CompiledExpression {
  operations: readonly Operation[];
  axes: readonly string[];
  outputs: readonly ComplexValue[];
}

/**
 * Compile an expression once, to be evaluated on any grid.
 *
 * @param text the expression, in the language of the allow-list
 * @param context the names it may use
 * @returns the steps, with one output
 * @throws DataError `expression/...` with the place of the character refused
 * @example compileExpression("sin(x - c*t)", { axes: ["x"], scalars: ["t", "c"] })
 * @see A. V. Aho, M. S. Lam, R. Sethi, J. D. Ullman, Compilers, 2nd ed., 2007, section 8.5 (shared subexpressions)
 */
export function compileExpression(text: string, context: ExpressionContext): CompiledExpression {
  return compileTrees([parseInContext(text, context)], context);
}

/**
 * Parse an expression with the names of a context, without compiling it.
 *
 * @throws DataError `expression/...` with the place of the character refused
 * @example parseInContext("2*x", { axes: ["x"], scalars: [] })
 */
export function parseInContext(text: string, context: ExpressionContext): ExpressionNode {
  const declared = namesOf(context);
  const known = new Set(declared);
  return parseExpression(text, {
    isDeclared: (name) => known.has(name),
    declared,
    hasDerivative: context.derivatives !== undefined,
    isComplex: context.isComplex === true || (context.complexFields?.length ?? 0) > 0,
  });
}

/**
 * Compile several checked trees into one list of steps that shares what they have in common.
 *
 * @param trees from `parseInContext` with the same context
 * @returns the steps, with one output for each tree
 * @throws DataError `expression/...` where a named expression is refused
 * @example compileTrees([parseInContext("x^2", context)], context)
 */
export function compileTrees(trees: ExpressionNode[], context: ExpressionContext): CompiledExpression {
  const compiler = new Compiler(context);
  const outputs = trees.map((tree) => compiler.compile(tree));
  return { operations: compiler.list.operations, axes: context.axes, outputs };
}

function namesOf(context: ExpressionContext): string[] {
  const { axes, scalars, fields = [], named = {} } = context;
  const names = [...axes, ...scalars, ...fields, ...Object.keys(named)];
  const reserved = names.find(isReservedName);
  if (reserved !== undefined) {
    throw new DataError("expression/reserved-name", `The name "${reserved}" is taken; choose another.`);
  }
  return names;
}

const binaryOfComparison: Record<string, [BinaryName, boolean]> = {
  "<": ["less", false],
  ">": ["less", true],
  "<=": ["lessOrEqual", false],
  ">=": ["lessOrEqual", true],
  "==": ["equal", false],
  "!=": ["unequal", false],
};

class Compiler {
  readonly list = new OperationList();
  private readonly complex = new ComplexArithmetic(this.list);
  private readonly namedValues = new Map<string, ComplexValue>();
  private readonly open: string[] = [];

  constructor(private readonly context: ExpressionContext) {}

  compile(node: ExpressionNode): ComplexValue {
    switch (node.kind) {
      case "number":
        return this.real(this.list.constant(node.value));
      case "name":
        return this.compileName(node.name);
      case "negative":
        return this.complex.negate(this.compile(node.arg));
      case "arithmetic":
        return this.compileArithmetic(node.sign, this.compile(node.left), this.compile(node.right));
      case "comparison":
        return this.compileComparison(node.sign, this.compile(node.left), this.compile(node.right));
      case "conditional": {
        const test = this.realPart(this.compile(node.test), "a condition");
        return this.complex.select(test, this.compile(node.then), this.compile(node.otherwise));
      }
      case "call":
        return this.compileCall(node);
    }
  }

  private compileName(name: string): ComplexValue {
    const { axes, scalars, fields = [], complexFields = [], named = {} } = this.context;
    const count = axes.length;
    if (axes.includes(name)) return this.real(this.list.variable(name, axes.indexOf(name), count));
    if (scalars.includes(name)) return this.real(this.list.variable(name, "scalar", count));
    if (fields.includes(name)) {
      const im = complexFields.includes(name) ? this.list.variable(`im ${name}`, "field", count) : null;
      return { re: this.list.variable(name, "field", count), im };
    }
    if (name in named) return this.compileNamed(name, named[name]);
    if (name === "i") return { re: this.list.constant(0), im: this.list.constant(1) };
    return this.real(this.list.constant(name === "pi" ? Math.PI : Math.E));
  }

  private compileNamed(name: string, text: string): ComplexValue {
    const found = this.namedValues.get(name);
    if (found) return found;
    if (this.open.includes(name)) {
      const circle = [...this.open.slice(this.open.indexOf(name)), name].join(" -> ");
      throw new DataError(
        "expression/circular",
        `The named expressions refer to each other in a circle: ${circle}.`,
      );
    }
    this.open.push(name);
    try {
      const value = this.compile(parseInContext(text, this.context));
      this.namedValues.set(name, value);
      return value;
    } catch (error) {
      if (!(error instanceof DataError) || error.where?.includes(" of ")) throw error;
      throw new DataError(error.code, error.message, `${error.where ?? "somewhere"} of ${name}`);
    } finally {
      this.open.pop();
    }
  }

  private compileArithmetic(sign: string, left: ComplexValue, right: ComplexValue): ComplexValue {
    if (sign === "+") return this.complex.add(left, right);
    if (sign === "-") return this.complex.subtract(left, right);
    if (sign === "*") return this.complex.multiply(left, right);
    if (sign === "/") return this.complex.divide(left, right);
    return this.complex.power(left, right);
  }

  private compileComparison(sign: string, left: ComplexValue, right: ComplexValue): ComplexValue {
    const a = this.realPart(left, "a comparison");
    const b = this.realPart(right, "a comparison");
    const [name, isExchanged] = binaryOfComparison[sign];
    return this.real(isExchanged ? this.list.binary(name, b, a) : this.list.binary(name, a, b));
  }

  private compileCall(node: Extract<ExpressionNode, { kind: "call" }>): ComplexValue {
    if (node.name === "d") return this.compileDerivative(node);
    const args = node.args.map((arg) => this.compile(arg));
    const [first] = args;
    if (node.name === "re") return this.real(first.re);
    if (node.name === "im") return this.real(first.im ?? this.list.constant(0));
    if (node.name === "conj") return this.complex.conjugate(first);
    if (isUnary(node.name as UnaryName)) return this.complex.apply(node.name as UnaryName, first);
    const parts = args.map((arg) => this.realPart(arg, `the function ${node.name}`));
    return this.real(parts.reduce((a, b) => this.list.binary(node.name as BinaryName, a, b)));
  }

  private compileDerivative(node: Extract<ExpressionNode, { kind: "call" }>): ComplexValue {
    const [inner, along] = node.args;
    const allowed = this.context.derivatives ?? [];
    if (along.kind !== "name" || !allowed.includes(along.name)) {
      const message = `d(expression, axis) differentiates along ${allowed.join(", ")}; write one of these second.`;
      throw new DataError("expression/derivative", message, `character ${node.at + 1}`);
    }
    const value = this.compile(inner);
    const im = value.im === null ? null : this.list.derivative(value.im, along.name);
    return { re: this.list.derivative(value.re, along.name), im };
  }

  private real(re: number): ComplexValue {
    return { re, im: null };
  }

  private realPart(value: ComplexValue, where: string): number {
    if (value.im === null) return value.re;
    const message = `The value in ${where} is complex; write re(...), im(...) or abs(...) about it.`;
    throw new DataError("expression/complex-argument", message);
  }
}

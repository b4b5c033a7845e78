import type { ExpressionNode } from "./expression-node";

const greek = new Set(
  "alpha beta gamma delta epsilon zeta eta theta kappa lambda mu nu xi rho sigma tau phi chi psi omega Gamma Delta Theta Lambda Xi Sigma Phi Psi Omega".split(
    " ",
  ),
);
const special: Record<string, string> = {
  eps: "\\varepsilon",
  pi: "\\pi",
  e: "\\mathrm{e}",
  i: "\\mathrm{i}",
};
const namedByLatex = new Set("sin cos tan sinh cosh tanh log min max".split(" "));
const otherFunctions: Record<string, string> = {
  asin: "\\arcsin",
  acos: "\\arccos",
  atan: "\\arctan",
  atan2: "\\operatorname{atan2}",
  sech: "\\operatorname{sech}",
  sign: "\\operatorname{sgn}",
  erf: "\\operatorname{erf}",
  erfc: "\\operatorname{erfc}",
  re: "\\operatorname{Re}",
  im: "\\operatorname{Im}",
};
const comparisons: Record<string, string> = {
  "<": "<",
  ">": ">",
  "<=": "\\le",
  ">=": "\\ge",
  "==": "=",
  "!=": "\\ne",
};

/** How tightly the outermost operator of a text binds; a looser one inside a tighter one needs parentheses. */
enum Binding {
  Loosest,
  Sum,
  Sign,
  Product,
  Power,
  Atom,
}

interface Typeset {
  latex: string;
  binding: Binding;
}

/**
 * Write an expression in LaTeX, in the notation of the trade: `u_t + c\,u_x`, fractions, powers of e.
 *
 * @param node a checked tree
 * @returns LaTeX for KaTeX's mathematics mode
 * @example typesetExpression(parseInContext("nu*u_xx", context)) // "\\nu\\,u_{xx}"
 * @see D. E. Knuth, The TeXbook, 1984, chapter 18 (from memory)
 */
export function typesetExpression(node: ExpressionNode): string {
  return write(node).latex;
}

/**
 * Write a name in LaTeX: Greek letters, indices for trailing digits, derivatives as subscripts.
 *
 * @example typesetName("beta1") // "\\beta_{1}"
 * @see typesetExpression
 */
export function typesetName(name: string): string {
  const derivative = /^([A-Za-z][A-Za-z0-9]*)_([xyt]{1,4})$/.exec(name);
  if (derivative)
    return `${typesetName(derivative[1])}_${derivative[2].length > 1 ? `{${derivative[2]}}` : derivative[2]}`;
  const [, stem, digits] = /^([A-Za-z]+?(?:_[A-Za-z]+)*)_?(\d*)$/.exec(name) ?? [name, name, ""];
  const letters = stem.replaceAll("_", "\\_");
  const base = greek.has(stem)
    ? `\\${stem}`
    : (special[stem] ?? (stem.length > 1 ? `\\mathrm{${letters}}` : stem));
  return digits === "" ? base : `${base}_{${digits}}`;
}

/**
 * Write a number in LaTeX, with powers of ten for an exponent.
 *
 * @example typesetNumber(5e-4) // "5 \\cdot 10^{-4}"
 * @see typesetExpression
 */
export function typesetNumber(value: number): string {
  const [mantissa, exponent] = String(value).split("e");
  if (exponent !== undefined) return `${mantissa} \\cdot 10^{${Number(exponent)}}`;
  return mantissa;
}

function write(node: ExpressionNode): Typeset {
  switch (node.kind) {
    case "number":
      return {
        latex: typesetNumber(node.value),
        binding: node.text.includes("e") ? Binding.Product : Binding.Atom,
      };
    case "name":
      return { latex: typesetName(node.name), binding: Binding.Atom };
    case "negative":
      return { latex: `-${atLeast(node.arg, Binding.Product)}`, binding: Binding.Sign };
    case "comparison":
      return {
        latex: `${atLeast(node.left, Binding.Sum)} ${comparisons[node.sign]} ${atLeast(node.right, Binding.Sum)}`,
        binding: Binding.Loosest,
      };
    case "conditional":
      return { latex: writeCases(node), binding: Binding.Atom };
    case "call":
      return writeCall(node);
    case "arithmetic":
      return writeArithmetic(node);
  }
}

function atLeast(node: ExpressionNode, binding: Binding): string {
  const written = write(node);
  return written.binding >= binding ? written.latex : parenthesised(written.latex);
}

function parenthesised(latex: string): string {
  return /\\frac|\\begin|\\sqrt|\^/.test(latex) ? `\\left(${latex}\\right)` : `(${latex})`;
}

function writeArithmetic(node: Extract<ExpressionNode, { kind: "arithmetic" }>): Typeset {
  const { sign, left, right } = node;
  if (sign === "+" || sign === "-") {
    // A sum to the right of a minus sign, and a signed term to the right of either, keep their parentheses.
    const last = atLeast(right, sign === "-" ? Binding.Product : Binding.Sum);
    const isSigned = last.startsWith("-");
    return {
      latex: `${atLeast(left, Binding.Sum)} ${sign} ${isSigned ? parenthesised(last) : last}`,
      binding: Binding.Sum,
    };
  }
  if (sign === "*") {
    const [first, second] = [atLeast(left, Binding.Sign), atLeast(right, Binding.Product)];
    const joint = /^[\d-]/.test(second) || /^\\t?frac\{\d/.test(second) ? " \\cdot " : "\\,";
    return {
      latex: `${first}${joint}${second}`,
      binding: first.startsWith("-") ? Binding.Sign : Binding.Product,
    };
  }
  if (sign === "/") {
    if (left.kind === "negative") {
      return { latex: `-${writeArithmetic({ ...node, left: left.arg }).latex}`, binding: Binding.Sign };
    }
    const areNumbers = left.kind === "number" && right.kind === "number";
    const latex = `\\${areNumbers ? "tfrac" : "frac"}{${write(left).latex}}{${write(right).latex}}`;
    return { latex, binding: Binding.Product };
  }
  return writePower(left, right);
}

function writePower(base: ExpressionNode, exponent: ExpressionNode): Typeset {
  const power = `^{${write(exponent).latex}}`;
  if (base.kind === "call" && namedByLatex.has(base.name) && base.args.length === 1) {
    return { latex: `\\${base.name}${power} ${writeArgument(base.args[0])}`, binding: Binding.Product };
  }
  return { latex: `${atLeast(base, Binding.Atom)}${power}`, binding: Binding.Power };
}

function writeArgument(node: ExpressionNode): string {
  return node.kind === "name" ? typesetName(node.name) : parenthesised(write(node).latex);
}

function writeCall(node: Extract<ExpressionNode, { kind: "call" }>): Typeset {
  const [first, second] = node.args;
  switch (node.name) {
    case "exp":
      return { latex: `\\mathrm{e}^{${write(first).latex}}`, binding: Binding.Power };
    case "sqrt":
      return { latex: `\\sqrt{${write(first).latex}}`, binding: Binding.Atom };
    case "abs":
      return { latex: `\\left|${write(first).latex}\\right|`, binding: Binding.Atom };
    case "conj":
      return { latex: `\\overline{${write(first).latex}}`, binding: Binding.Atom };
    case "mod":
      return {
        latex: `(${atLeast(first, Binding.Sum)}) \\bmod ${atLeast(second, Binding.Atom)}`,
        binding: Binding.Loosest,
      };
    case "d":
      return { latex: `${parenthesised(write(first).latex)}_${write(second).latex}`, binding: Binding.Atom };
  }
  const name = namedByLatex.has(node.name) ? `\\${node.name}` : otherFunctions[node.name];
  if (node.args.length > 1) {
    return {
      latex: `${name}${parenthesised(node.args.map((arg) => write(arg).latex).join(", "))}`,
      binding: Binding.Product,
    };
  }
  const argument = writeArgument(first);
  return {
    latex: argument.startsWith("(") ? `${name}${argument}` : `${name} ${argument}`,
    binding: Binding.Product,
  };
}

function writeCases(node: Extract<ExpressionNode, { kind: "conditional" }>): string {
  const rows: string[] = [];
  let rest: ExpressionNode = node;
  while (rest.kind === "conditional") {
    rows.push(`${write(rest.then).latex} & \\text{if } ${write(rest.test).latex}`);
    rest = rest.otherwise;
  }
  rows.push(`${write(rest).latex} & \\text{otherwise}`);
  return `\\begin{cases} ${rows.join(" \\\\ ")} \\end{cases}`;
}

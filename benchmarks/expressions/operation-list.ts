import {
  type BinaryName,
  binaryFunctions,
  type Operation,
  type UnaryName,
  unaryFunctions,
} from "./operation";

/** Collects the steps of an expression; equal steps are shared and steps on constants are carried out. */
export class OperationList {
  readonly operations: Operation[] = [];
  private readonly known = new Map<string, number>();

  constant(value: number): number {
    const key = `constant ${Object.is(value, -0) ? "-0" : value}`;
    return this.share(key, { name: "constant", value, axes: 0 });
  }

  /**
   * @param source index of the axis along which the variable changes, one number for the grid, or one for each node
   * @param axisCount axes of the grid
   */
  variable(variable: string, source: number | "scalar" | "field", axisCount: number): number {
    const axes = source === "scalar" ? 0 : source === "field" ? (1 << axisCount) - 1 : 1 << source;
    return this.share(`variable ${variable}`, { name: "variable", variable, source, axes });
  }

  unary(name: UnaryName, a: number): number {
    const value = this.constantAt(a);
    if (value !== null) return this.constant(unaryFunctions[name](value));
    return this.share(`${name} ${a}`, { name, a, axes: this.operations[a].axes });
  }

  binary(name: BinaryName, a: number, b: number): number {
    const left = this.constantAt(a);
    const right = this.constantAt(b);
    if (left !== null && right !== null) return this.constant(binaryFunctions[name](left, right));
    const axes = this.operations[a].axes | this.operations[b].axes;
    return this.share(`${name} ${a} ${b}`, { name, a, b, axes });
  }

  select(test: number, then: number, otherwise: number): number {
    const value = this.constantAt(test);
    if (value !== null) return value !== 0 ? then : otherwise;
    const axes = this.operations[test].axes | this.operations[then].axes | this.operations[otherwise].axes;
    return this.share(`select ${test} ${then} ${otherwise}`, { name: "select", test, then, otherwise, axes });
  }

  derivative(a: number, along: string): number {
    return this.share(`derivative ${a} ${along}`, {
      name: "derivative",
      a,
      along,
      axes: this.operations[a].axes,
    });
  }

  /** The value of a step that is a constant, else null. */
  constantAt(index: number): number | null {
    const operation = this.operations[index];
    return operation.name === "constant" ? operation.value : null;
  }

  /** a to a whole power, by repeated squaring. */
  wholePower(a: number, exponent: number): number {
    if (exponent < 0) return this.binary("div", this.constant(1), this.wholePower(a, -exponent));
    if (exponent === 0) return this.constant(1);
    if (exponent === 1) return a;
    const half = this.wholePower(a, Math.floor(exponent / 2));
    const square = this.binary("mul", half, half);
    return exponent % 2 === 0 ? square : this.binary("mul", square, a);
  }

  private share(key: string, operation: Operation): number {
    const found = this.known.get(key);
    if (found !== undefined) return found;
    this.operations.push(operation);
    this.known.set(key, this.operations.length - 1);
    return this.operations.length - 1;
  }
}

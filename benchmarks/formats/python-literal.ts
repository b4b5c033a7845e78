/** The literals of Python that headers of NPY files consist of, read without evaluating anything. */

import { DataError } from "../scoring/data-error";

/**
 * A value of the literal, with the index of its first character.
 *
 * @example parsePythonLiteral("(3, 4)", 0) // { kind: "tuple", items: [...], at: 0 }
 */
export type PythonValue =
  | { kind: "string"; text: string; at: number }
  | { kind: "integer"; value: number; at: number }
  | { kind: "boolean"; value: boolean; at: number }
  | { kind: "none"; at: number }
  | { kind: "tuple" | "list"; items: PythonValue[]; at: number }
  | { kind: "dict"; entries: Map<string, PythonValue>; at: number };

const maxDepth = 16;

/**
 * Reads one Python literal: a dictionary with string keys, a tuple, list, string, integer, boolean or None.
 *
 * Stricter than Python where NumPy never writes more: no expressions, no concatenated or prefixed strings,
 * no escapes in strings, no repeated keys. White space may follow the literal and nothing else.
 *
 * @param text the literal, one character a byte
 * @param firstByte byte offset of the text in its file, for refusals
 * @returns the value with positions counted in characters of `text`
 * @throws DataError `format/bad-header` naming the byte at which the text stops being a literal
 * @example parsePythonLiteral("{'shape': (3,)}", 10)
 * @see https://docs.python.org/3/reference/expressions.html#literals
 */
export function parsePythonLiteral(text: string, firstByte: number): PythonValue {
  const parser = new LiteralParser(text, firstByte);
  return parser.parseWhole();
}

class LiteralParser {
  private at = 0;

  constructor(
    private readonly text: string,
    private readonly firstByte: number,
  ) {}

  parseWhole(): PythonValue {
    const value = this.parseValue(0);
    this.skipSpace();
    if (this.at < this.text.length) this.fail("the end of the header");
    return value;
  }

  private parseValue(depth: number): PythonValue {
    if (depth > maxDepth) this.fail(`at most ${maxDepth} nested brackets`);
    this.skipSpace();
    const character = this.text[this.at];
    if (character === "{") return this.parseDict(depth);
    if (character === "(") return this.parseSequence("tuple", ")", depth);
    if (character === "[") return this.parseSequence("list", "]", depth);
    if (character === "'" || character === '"') return this.parseString(character);
    return this.parseWord();
  }

  private parseDict(depth: number): PythonValue {
    const start = this.at++;
    const entries = new Map<string, PythonValue>();
    for (;;) {
      this.skipSpace();
      if (this.takes("}")) return { kind: "dict", entries, at: start };
      const keyAt = this.at;
      const quote = this.text[this.at];
      if (quote !== "'" && quote !== '"') this.fail("a quoted key or a closing brace");
      const key = this.parseString(quote).text;
      if (entries.has(key)) this.fail(`each key once, and "${key}" is there twice`, keyAt);
      this.skipSpace();
      if (!this.takes(":")) this.fail("a colon");
      entries.set(key, this.parseValue(depth + 1));
      this.skipSpace();
      if (this.takes(",")) continue;
      if (this.text[this.at] !== "}") this.fail("a comma or a closing brace");
    }
  }

  private parseSequence(kind: "tuple" | "list", close: string, depth: number): PythonValue {
    const start = this.at++;
    const items: PythonValue[] = [];
    let hasComma = false;
    for (;;) {
      this.skipSpace();
      if (this.takes(close)) break;
      items.push(this.parseValue(depth + 1));
      this.skipSpace();
      if (this.takes(",")) hasComma = true;
      else if (this.text[this.at] !== close) this.fail(`a comma or "${close}"`);
    }
    // In Python (3) is a number and only (3,) a tuple.
    if (kind === "tuple" && items.length === 1 && !hasComma) this.fail("a comma after a tuple's only item");
    return { kind, items, at: start };
  }

  private parseString(quote: string): { kind: "string"; text: string; at: number } {
    const start = this.at++;
    const end = this.text.indexOf(quote, this.at);
    if (end < 0) this.fail("a closing quotation mark", this.text.length);
    const text = this.text.slice(this.at, end);
    const escape = text.search(/[\\\n]/);
    if (escape >= 0) this.fail("a string without escapes and line ends", this.at + escape);
    this.at = end + 1;
    return { kind: "string", text, at: start };
  }

  private parseWord(): PythonValue {
    const start = this.at;
    const word = /^-?[A-Za-z0-9_]+/.exec(this.text.slice(start, start + 64))?.[0] ?? "";
    this.at += word.length;
    if (word === "True" || word === "False") return { kind: "boolean", value: word === "True", at: start };
    if (word === "None") return { kind: "none", at: start };
    // Python 2 wrote long integers with an L.
    if (/^-?(0|[1-9][0-9]*)L?$/.test(word)) {
      return { kind: "integer", value: Number.parseInt(word, 10), at: start };
    }
    return this.fail("a literal", start);
  }

  private takes(character: string): boolean {
    if (this.text[this.at] !== character) return false;
    this.at++;
    return true;
  }

  private skipSpace(): void {
    while (this.at < this.text.length && " \t\r\n".includes(this.text[this.at])) this.at++;
  }

  private fail(expected: string, at = this.at): never {
    const byte = this.firstByte + at;
    const found = at < this.text.length ? JSON.stringify(this.text.slice(at, at + 12)) : "the header's end";
    throw new DataError(
      "format/bad-header",
      `The header is not a Python dictionary of literals: at byte ${byte} stands ${found}, expected was ` +
        `${expected}. Write the file with numpy.save or numpy.savez.`,
      `byte ${byte}`,
    );
  }
}

import { DataError } from "../scoring/data-error";
import { constantNames, functionArity } from "./allowed-names";

export const longestExpression = 2000;
export const deepestNesting = 64;

export interface Token {
  kind: "number" | "name" | "operator" | "open" | "close" | "comma";
  text: string;
  /** Offset of the first character, from 0. */
  at: number;
}

export interface ScanNames {
  isDeclared: (name: string) => boolean;
  declared: readonly string[];
  /** The derivative d(expression, axis), which only equations may use. */
  hasDerivative: boolean;
  /** The imaginary unit i and re, im, conj. */
  isComplex: boolean;
}

const complexNames = new Set(["i", "re", "im", "conj"]);
const tokenPattern =
  /(\d+(?:\.\d+)?(?:[eE][+-]?\d+)?|\.\d+(?:[eE][+-]?\d+)?)|([A-Za-z][A-Za-z0-9_]*)|(<=|>=|==|!=|[-+*/^<>?:])|(\()|(\))|(,)/y;

/**
 * Refuse an expression at a character.
 *
 * @param at offset from 0; people are told the place from 1
 * @throws DataError always
 */
export function refuseAt(code: string, message: string, at: number): never {
  throw new DataError(`expression/${code}`, message, `character ${at + 1}`);
}

/**
 * Cut an expression into tokens and refuse what the allow-list of names and signs does not hold.
 *
 * Length and nesting are checked here, before the library's recursive parser sees the text: four hundred
 * parentheses overflow it. Each name is checked in place, and a missing multiplication sign is refused.
 *
 * @param text the expression, at most 2,000 characters and 64 levels deep
 * @param names what may be named
 * @returns the tokens in order
 * @throws DataError `expression/...` with the place of the first character refused
 * @example scanExpression("2*x", names).length // 3
 */
export function scanExpression(text: string, names: ScanNames): Token[] {
  if (text.length > longestExpression) {
    const message = `The expression has ${text.length} characters; at most ${longestExpression} are read. Shorten it, or move parts of it into named expressions.`;
    refuseAt("too-long", message, longestExpression);
  }
  const tokens = cutIntoTokens(text);
  if (tokens.length === 0)
    refuseAt("empty", "The expression is empty; write a number, a name or a formula.", 0);
  checkNesting(tokens);
  tokens.forEach((token, index) => checkToken(token, tokens[index - 1], tokens[index + 1], names));
  return tokens;
}

function cutIntoTokens(text: string): Token[] {
  const kinds = ["number", "name", "operator", "open", "close", "comma"] as const;
  const tokens: Token[] = [];
  let at = 0;
  while (at < text.length) {
    if (text[at] === " " || text[at] === "\t") {
      at += 1;
      continue;
    }
    tokenPattern.lastIndex = at;
    const match = tokenPattern.exec(text);
    if (!match) {
      const message = `The character ${JSON.stringify(text[at])} has no meaning in an expression; write numbers, names, + - * / ^, comparisons, ? : and parentheses.`;
      refuseAt("character", message, at);
    }
    const kind = kinds[match.slice(1).findIndex((group) => group !== undefined)];
    tokens.push({ kind, text: match[0], at });
    at += match[0].length;
  }
  return tokens;
}

/** Everything that makes the library's parser recurse counts: parentheses, signs, powers, conditions. */
function checkNesting(tokens: Token[]): void {
  const levels = [0];
  let depth = 0;
  const previousEndsValue = (index: number) => index > 0 && endsValue(tokens[index - 1]);
  tokens.forEach((token, index) => {
    if (token.kind === "open") levels.push(0);
    else if (token.kind === "close") {
      if (levels.length === 1)
        refuseAt("syntax", "This closing parenthesis was never opened; remove it.", token.at);
      levels.pop();
    } else if (token.kind === "comma") levels[levels.length - 1] = 0;
    else if (token.kind === "operator") {
      const isSign = !previousEndsValue(index);
      if (isSign || token.text === "^" || token.text === "?") levels[levels.length - 1] += 1;
    }
    depth = levels.length - 1 + levels.reduce((sum, count) => sum + count, 0);
    if (depth > deepestNesting) {
      const message = `The expression is nested more than ${deepestNesting} levels deep here; move parts of it into named expressions.`;
      refuseAt("too-deep", message, token.at);
    }
  });
  if (levels.length > 1) {
    const open = findUnclosed(tokens);
    refuseAt("syntax", "This parenthesis is never closed; add the closing one.", open.at);
  }
}

function findUnclosed(tokens: Token[]): Token {
  const opened: Token[] = [];
  for (const token of tokens) {
    if (token.kind === "open") opened.push(token);
    if (token.kind === "close") opened.pop();
  }
  return opened[opened.length - 1];
}

function endsValue(token: Token): boolean {
  return token.kind === "number" || token.kind === "name" || token.kind === "close";
}

function startsValue(token: Token): boolean {
  return token.kind === "number" || token.kind === "name" || token.kind === "open";
}

function checkToken(
  token: Token,
  before: Token | undefined,
  after: Token | undefined,
  names: ScanNames,
): void {
  const isCall = token.kind === "open" && before?.kind === "name";
  if (before && endsValue(before) && startsValue(token) && !isCall) {
    refuseAt(
      "syntax",
      `An operator is missing before "${token.text}"; write the multiplication sign.`,
      token.at,
    );
  }
  if (token.kind === "number" && !Number.isFinite(Number(token.text))) {
    refuseAt("number", `The number ${token.text} is too large for double precision.`, token.at);
  }
  if (token.kind === "name") checkName(token, after, names);
}

function checkName(token: Token, after: Token | undefined, names: ScanNames): void {
  const isCalled = after?.kind === "open";
  const isFunction = isKnownFunction(token.text, names);
  if (isCalled && !isFunction) {
    const isValue = names.isDeclared(token.text) || constantNames.has(token.text);
    const message = isValue
      ? `"${token.text}" is not a function; write the multiplication sign before the parenthesis.`
      : `There is no function "${token.text}"; the functions are ${[...functionArity.keys()].join(", ")}.`;
    refuseAt("unknown-function", message, token.at);
  }
  if (isCalled || names.isDeclared(token.text)) return;
  if (constantNames.has(token.text) && (names.isComplex || token.text !== "i")) return;
  if (isFunction)
    refuseAt("syntax", `The function "${token.text}" needs its argument in parentheses.`, token.at);
  const message = `The name "${token.text}" is not declared; here one may write ${[...names.declared, "pi", "e"].join(", ")}. Use one of these, or declare it.`;
  refuseAt("unknown-name", message, token.at);
}

function isKnownFunction(name: string, names: ScanNames): boolean {
  if (name === "d") return names.hasDerivative;
  if (complexNames.has(name)) return names.isComplex && functionArity.has(name);
  return functionArity.has(name);
}

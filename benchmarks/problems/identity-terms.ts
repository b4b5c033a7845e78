import {
  type CompiledExpression,
  compileTrees,
  type ExpressionContext,
  parseInContext,
} from "../expressions/compile-expression";
import type { ExpressionNode } from "../expressions/expression-node";
import { DataError } from "../scoring/data-error";
import type { ProblemDefinition } from "./definition";
import { contextOf } from "./problem-context";

/** An identity as a sum of terms that vanishes: one output for each term. */
export interface IdentityTerms {
  compiled: CompiledExpression;
  signs: (1 | -1)[];
}

/** Both sides of an identity as checked trees. */
export interface IdentitySides {
  left: ExpressionNode;
  right: ExpressionNode;
}

const derivativeName = /[A-Za-z][A-Za-z0-9]*_[xyt]{1,4}/g;

/**
 * The field and the directions that a derivative's name stands for.
 *
 * @returns null where the name is not a derivative of one of the fields
 * @example readDerivativeName("u_xx", ["u"]) // { field: "u", along: ["x", "x"] }
 * @see ProblemDefinition.equations
 */
export function readDerivativeName(
  name: string,
  fields: readonly string[],
): { field: string; along: string[] } | null {
  const field = fields.find((candidate) => name.startsWith(`${candidate}_`));
  if (field === undefined) return null;
  const letters = name.slice(field.length + 1);
  return /^[xyt]{1,4}$/.test(letters) ? { field, along: [...letters] } : null;
}

/**
 * The names that a problem's equations may use: those of its expressions, the fields and their derivatives.
 *
 * @example equationContext(problem).fields // ["u", "u_t", "u_x"]
 * @see contextOf
 */
export function equationContext(problem: ProblemDefinition): ExpressionContext {
  const context = contextOf(problem);
  const fields = problem.fields.map((field) => field.name);
  const directions = [...context.axes, ...(problem.classification.isSteady ? [] : ["t"])];
  const texts = [...problem.equations.map(({ identity }) => identity), ...Object.values(context.named ?? {})];
  const used = new Set(texts.flatMap((text) => text.match(derivativeName) ?? []));
  const derivatives = [...used].filter((name) => {
    const read = readDerivativeName(name, fields);
    return read !== null && read.along.every((direction) => directions.includes(direction));
  });
  const complexOnes = problem.fields.filter((field) => field.values === "complex").map((field) => field.name);
  const isComplex = (name: string) =>
    complexOnes.some((field) => name === field || name.startsWith(`${field}_`));
  const all = [...fields, ...derivatives];
  return { ...context, fields: all, complexFields: all.filter(isComplex), derivatives: directions };
}

/**
 * Parse both sides of an identity such as `u_t + c*u_x = nu*u_xx`.
 *
 * @throws DataError `expression/...` with the place in the identity
 * @example parseIdentity("u_t + c*u_x = 0", context).right // { kind: "number", value: 0, text: "0" }
 * @see parseInContext
 */
export function parseIdentity(identity: string, context: ExpressionContext): IdentitySides {
  const places = [...identity.matchAll(/(?<![<>=!])=(?!=)/g)].map((match) => match.index);
  if (places.length !== 1) {
    const where = `character ${(places[1] ?? identity.length) + 1}`;
    throw new DataError(
      "expression/identity",
      `An equation has one = sign; this one has ${places.length}.`,
      where,
    );
  }
  const [place] = places;
  return {
    left: parseInContext(identity.slice(0, place), context),
    // Blanks keep the places of the right side those of the whole identity.
    right: parseInContext(" ".repeat(place + 1) + identity.slice(place + 1), context),
  };
}

/**
 * Take an identity apart into the terms of left side minus right side.
 *
 * @returns the terms compiled together, and the sign of each
 * @throws DataError `expression/...` with the place in the identity
 * @example identityTerms("u_t + c*u_x = 0", context).signs // [1, 1, -1]
 * @see parseIdentity
 */
export function identityTerms(identity: string, context: ExpressionContext): IdentityTerms {
  const terms = identityTrees(identity, context);
  const trees = terms.map(({ node }) => node);
  return { compiled: compileTrees(trees, context), signs: terms.map(({ sign }) => sign) };
}

/**
 * The terms of left side minus right side as checked trees.
 *
 * @throws DataError `expression/...` with the place in the identity
 * @example identityTrees("u_t = u_xx", context).length // 2
 * @see identityTerms
 */
export function identityTrees(identity: string, context: ExpressionContext): SignedTerm[] {
  const { left, right } = parseIdentity(identity, context);
  return [...flatten(left, 1), ...flatten(right, -1)];
}

/** A term of a sum. */
export interface SignedTerm {
  node: ExpressionNode;
  sign: 1 | -1;
}

function flatten(node: ExpressionNode, sign: 1 | -1): SignedTerm[] {
  const opposite = sign === 1 ? -1 : 1;
  if (node.kind === "negative") return flatten(node.arg, opposite);
  if (node.kind !== "arithmetic" || (node.sign !== "+" && node.sign !== "-")) return [{ node, sign }];
  return [...flatten(node.left, sign), ...flatten(node.right, node.sign === "+" ? sign : opposite)];
}

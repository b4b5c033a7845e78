/** Values shared by the database, the forms, the API and the pages. This file imports nothing. */

export const roles = ["author", "maintainer", "admin"] as const;
export type Role = (typeof roles)[number];

export const membershipRoles = ["owner", "member"] as const;
export type MembershipRole = (typeof membershipRoles)[number];

export const linkKinds = ["verifyEmail", "resetPassword"] as const;
export type LinkKind = (typeof linkKinds)[number];

export const apiScopes = ["read", "submit", "curate", "review"] as const;
export type ApiScope = (typeof apiScopes)[number];

export const revisionStates = ["draft", "published", "retired"] as const;
export type RevisionState = (typeof revisionStates)[number];

export const methodFamilies = [
  "finiteDifference",
  "compactDifference",
  "finiteVolume",
  "finiteElement",
  "fourier",
  "chebyshev",
  "other",
] as const;
export type MethodFamily = (typeof methodFamilies)[number];

export const claimKinds = ["algebraic", "exponential", "none"] as const;
export type ClaimKind = (typeof claimKinds)[number];

export const submissionStates = [
  "draft",
  "checking",
  "scored",
  "inReview",
  "listed",
  "returned",
  "superseded",
  "withdrawn",
  "failed",
] as const;
export type SubmissionState = (typeof submissionStates)[number];

/** States in which a submission is a record and anyone may read it. */
export const publicStates = ["listed", "superseded", "withdrawn"] as const satisfies SubmissionState[];

export const runRoles = ["study", "timeStep", "iteration"] as const;
export type RunRole = (typeof runRoles)[number];

export const runStates = ["waiting", "scored", "refused"] as const;
export type RunState = (typeof runStates)[number];

export const precisions = ["float64", "float32"] as const;
export type Precision = (typeof precisions)[number];

export const valueKinds = ["point", "cellAverage"] as const;
export type ValueKind = (typeof valueKinds)[number];

export const relativeNorms = ["relL1", "relL2", "relMax"] as const;
export type RelativeNorm = (typeof relativeNorms)[number];

export const measures = ["nodes", "between"] as const;
export type Measure = (typeof measures)[number];

export const findingSeverities = ["note", "warning", "strong"] as const;
export type FindingSeverity = (typeof findingSeverities)[number];

export const decisionKinds = ["list", "return", "withdraw"] as const;
export type DecisionKind = (typeof decisionKinds)[number];

export const dataLicences = ["CC-BY-4.0", "CC0-1.0", "CC-BY-SA-4.0", "ODbL-1.0", "PDDL-1.0"] as const;
export type DataLicence = (typeof dataLicences)[number];

/**
 * Who gets which status. People come with a session on pages and on reads of the API, and with a token that has all
 * scopes of their role on its writes; the last four are tokens with one scope, of an author (read, submit), a
 * maintainer (curate) and an admin (review). The submissions belong to the author's team.
 */
export const viewers = [
  "visitor",
  "author",
  "other",
  "maintainer",
  "admin",
  "read",
  "submit",
  "curate",
  "review",
] as const;
export type ViewerName = (typeof viewers)[number];

interface MatrixRow {
  call: string;
  method: "GET" | "POST";
  /** Names in braces are what the test has made. */
  path: string;
  expected: Record<ViewerName, number>;
}

type Expected = [
  visitor: number,
  author: number,
  other: number,
  maintainer: number,
  admin: number,
  ...tokens: [read: number, submit: number, curate: number, review: number],
];

function row(call: string, request: string, expected: Expected): MatrixRow {
  const [method, path] = request.split(" ") as ["GET" | "POST", string];
  const byViewer = Object.fromEntries(viewers.map((viewer, i) => [viewer, expected[i]]));
  return { call, method, path, expected: byViewer as Record<ViewerName, number> };
}

/** A token opens no page: there it is a visitor. */
const page = (
  call: string,
  request: string,
  [visitor, ...people]: [visitor: number, author: number, other: number, maintainer: number, admin: number],
) => row(call, request, [visitor, ...people, visitor, visitor, visitor, visitor]);

const everyone = (call: string, request: string, status: number) =>
  page(call, request, [status, status, status, status, status]);

/** A token reads only with the scope to read, even what is public. */
const publicRead = (call: string, request: string, status = 200) =>
  row(call, request, [status, status, status, status, status, status, 403, 403, 403]);

export const matrix: MatrixRow[] = [
  everyone("routes/home.tsx loader", "GET /", 200),
  everyone("routes/problems/list.tsx loader", "GET /problems", 200),
  everyone("routes/problems/show.tsx loader", "GET /problems/advection-exp-sine", 200),
  everyone("routes/records/list.tsx loader", "GET /records", 200),
  everyone("routes/records/show.tsx loader", "GET /records/{record}", 200),
  everyone("routes/not-found.tsx loader", "GET /nothing-here", 404),

  page("routes/accounts/sign-in.tsx loader", "GET /sign-in", [200, 302, 302, 302, 302]),
  // Those who are signed in are led on, whatever they post.
  page("routes/accounts/sign-in.tsx action", "POST /sign-in", [422, 302, 302, 302, 302]),
  page("routes/accounts/join.tsx loader", "GET /join", [200, 302, 302, 302, 302]),
  page("routes/accounts/join.tsx action", "POST /join", [422, 302, 302, 302, 302]),
  everyone("routes/accounts/forgot.tsx action", "POST /forgot", 422),
  everyone("routes/accounts/reset.tsx loader", "GET /reset/unknown", 200),
  everyone("routes/accounts/reset.tsx action", "POST /reset/unknown", 422),
  everyone("routes/accounts/verify.tsx loader", "GET /verify/unknown", 200),
  everyone("routes/accounts/verify.tsx action", "POST /verify/unknown", 422),
  page("routes/accounts/show.tsx loader", "GET /account", [302, 200, 200, 200, 200]),
  page("routes/accounts/show.tsx action", "POST /account", [302, 422, 422, 422, 422]),
  page("routes/accounts/tokens.tsx loader", "GET /account/tokens", [302, 200, 200, 200, 200]),
  page("routes/accounts/tokens.tsx action", "POST /account/tokens", [302, 422, 422, 422, 422]),
  page("routes/accounts/teams.tsx loader", "GET /account/teams", [302, 200, 200, 200, 200]),
  page("routes/accounts/teams.tsx action", "POST /account/teams", [302, 422, 422, 422, 422]),

  page("routes/submissions/new.tsx loader", "GET /submit", [302, 200, 200, 200, 200]),
  page("routes/submissions/new.tsx action", "POST /submit", [302, 422, 422, 422, 422]),
  page("routes/submissions/list.tsx loader", "GET /submissions", [302, 200, 200, 200, 200]),
  page("routes/submissions/show.tsx loader", "GET /submissions/{scored}", [404, 200, 404, 404, 200]),
  page("routes/submissions/show.tsx loader", "GET /submissions/{inReview}", [404, 200, 404, 200, 200]),
  everyone("routes/submissions/show.tsx loader", "GET /submissions/{listed}", 302),
  page("routes/submissions/show.tsx action", "POST /submissions/{inReview}", [302, 409, 404, 404, 404]),
  page(
    "routes/submissions/show.tsx action",
    "POST /submissions/{listed}?withdraw",
    [302, 422, 403, 403, 422],
  ),
  page(
    "routes/submissions/progress.ts loader",
    "GET /submissions/{scored}/progress",
    [404, 200, 404, 404, 200],
  ),
  page("routes/submissions/file.ts loader", "GET /files/{scoredRun}", [404, 200, 404, 404, 200]),
  everyone("routes/submissions/file.ts loader", "GET /files/{listedRun}", 200),

  page("routes/moderation/list.tsx loader", "GET /moderation", [302, 403, 403, 403, 200]),
  page("routes/moderation/log.tsx loader", "GET /moderation/log", [302, 403, 403, 403, 200]),
  page("routes/moderation/show.tsx loader", "GET /moderation/{inReview}", [302, 403, 403, 403, 200]),
  page("routes/moderation/show.tsx action", "POST /moderation/{inReview}", [302, 403, 403, 403, 422]),
  page("routes/moderation/show.tsx action", "POST /moderation/{inReview}?list", [302, 403, 403, 403, 422]),

  everyone("routes/accounts/sign-out.ts loader", "GET /sign-out", 405),

  publicRead("routes/api/health.ts loader", "GET /api/v1/health"),
  publicRead("routes/api/ready.ts loader", "GET /api/v1/ready"),
  publicRead("routes/api/problems.ts loader", "GET /api/v1/problems"),
  publicRead("routes/api/problem.ts loader", "GET /api/v1/problems/advection-exp-sine"),
  publicRead("routes/api/problem-revision.ts loader", "GET /api/v1/problems/advection-exp-sine/revisions/1"),
  publicRead("routes/api/ranking.ts loader", "GET /api/v1/problems/advection-exp-sine/ranking"),
  publicRead("routes/api/record.ts loader", "GET /api/v1/records/{record}"),
  publicRead("routes/api/not-found.ts loader", "GET /api/v1/nothing-here", 404),
  row(
    "routes/api/not-found.ts action",
    "POST /api/v1/nothing-here",
    [404, 404, 404, 404, 404, 404, 404, 404, 404],
  ),
  row("routes/api/score.ts action", "POST /api/v1/score", [422, 422, 422, 422, 422, 422, 422, 422, 422]),
  row(
    "routes/api/submissions.ts loader",
    "GET /api/v1/submissions",
    [401, 200, 200, 200, 200, 200, 403, 403, 403],
  ),
  row(
    "routes/api/submissions.ts action",
    "POST /api/v1/submissions",
    [401, 422, 422, 422, 422, 403, 422, 403, 403],
  ),
  row(
    "routes/api/submission.ts loader",
    "GET /api/v1/submissions/{scored}",
    [404, 200, 404, 404, 200, 200, 403, 403, 403],
  ),
  row(
    "routes/api/submission.ts loader",
    "GET /api/v1/submissions/{inReview}",
    [404, 200, 404, 200, 200, 200, 403, 403, 403],
  ),
  publicRead("routes/api/submission.ts loader", "GET /api/v1/submissions/{listed}"),
  row(
    "routes/api/progress.ts loader",
    "GET /api/v1/submissions/{scored}/progress",
    [404, 200, 404, 404, 200, 200, 403, 403, 403],
  ),
  row(
    "routes/api/file.ts loader",
    "GET /api/v1/submissions/{scored}/files/{scoredRun}",
    [404, 200, 404, 404, 200, 200, 403, 403, 403],
  ),
  publicRead("routes/api/file.ts loader", "GET /api/v1/submissions/{listed}/files/{listedRun}"),
  row(
    "routes/api/hand-in.ts action",
    "POST /api/v1/submissions/{inReview}/hand-in",
    [401, 409, 404, 404, 404, 403, 409, 403, 403],
  ),
  row(
    "routes/api/list-submission.ts action",
    "POST /api/v1/submissions/{inReview}/list",
    [401, 403, 403, 403, 422, 403, 403, 403, 422],
  ),
  row(
    "routes/api/return-submission.ts action",
    "POST /api/v1/submissions/{inReview}/return",
    [401, 403, 403, 403, 422, 403, 403, 403, 422],
  ),
  row(
    "routes/api/withdraw.ts action",
    "POST /api/v1/submissions/{listed}/withdraw",
    [401, 422, 403, 403, 422, 403, 422, 403, 422],
  ),

  // Last: it ends the sessions of those who call it.
  everyone("routes/accounts/sign-out.ts action", "POST /sign-out", 302),
];

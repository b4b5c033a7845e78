import { type RouteConfig, index, layout, prefix, route } from "@react-router/dev/routes";

export default [
  layout("routes/layout.tsx", [
    index("routes/home.tsx"),
    route("problems", "routes/problems/list.tsx"),
    route("problems/:slug", "routes/problems/show.tsx"),
    route("records", "routes/records/list.tsx"),
    route("records/:number/:version", "routes/records/show.tsx"),
    route("scoring", "routes/scoring.tsx"),

    route("sign-in", "routes/accounts/sign-in.tsx"),
    route("join", "routes/accounts/join.tsx"),
    route("forgot", "routes/accounts/forgot.tsx"),
    route("reset/:token", "routes/accounts/reset.tsx"),
    route("verify/:token", "routes/accounts/verify.tsx"),
    route("account", "routes/accounts/show.tsx"),
    route("account/tokens", "routes/accounts/tokens.tsx"),
    route("account/teams", "routes/accounts/teams.tsx"),

    route("submit", "routes/submissions/new.tsx"),
    route("submissions", "routes/submissions/list.tsx"),
    route("submissions/:id", "routes/submissions/show.tsx"),

    route("moderation", "routes/moderation/list.tsx"),
    route("moderation/log", "routes/moderation/log.tsx"),
    route("moderation/:id", "routes/moderation/show.tsx"),

    route("*", "routes/not-found.tsx"),
  ]),
  route("sign-out", "routes/accounts/sign-out.ts"),
  route("submissions/:id/progress", "routes/submissions/progress.ts"),
  route("files/:runId", "routes/submissions/file.ts"),

  ...prefix("api/v1", [
    route("health", "routes/api/health.ts"),
    route("ready", "routes/api/ready.ts"),
    route("problems", "routes/api/problems.ts"),
    route("problems/:slug", "routes/api/problem.ts"),
    route("problems/:slug/revisions/:revision", "routes/api/problem-revision.ts"),
    route("problems/:slug/ranking", "routes/api/ranking.ts"),
    route("score", "routes/api/score.ts"),
    route("submissions", "routes/api/submissions.ts"),
    route("submissions/:id", "routes/api/submission.ts"),
    route("submissions/:id/progress", "routes/api/progress.ts"),
    route("submissions/:id/hand-in", "routes/api/hand-in.ts"),
    route("submissions/:id/list", "routes/api/list-submission.ts"),
    route("submissions/:id/return", "routes/api/return-submission.ts"),
    route("submissions/:id/withdraw", "routes/api/withdraw.ts"),
    route("submissions/:id/files/:runId", "routes/api/file.ts"),
    route("records/:number/:version", "routes/api/record.ts"),
    route("*", "routes/api/not-found.ts"),
  ]),
] satisfies RouteConfig;

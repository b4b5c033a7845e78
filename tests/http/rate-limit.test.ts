import { describe, expect, it } from "vitest";
import { createRateLimiter } from "@/app/http/rate-limit.server";

function limiterAtStart() {
  const clock = { ms: 0 };
  const take = createRateLimiter({ name: "writes", limit: 60, windowSeconds: 60 }, () => clock.ms);
  return { clock, take };
}

describe("a rate limit", () => {
  it("takes as many calls as its limit at once and refuses the next", () => {
    const { take } = limiterAtStart();
    const answers = Array.from({ length: 61 }, () => take("a").isAllowed);
    expect(answers.slice(0, 60).every(Boolean)).toBe(true);
    expect(answers[60]).toBe(false);
  });

  it("says with every answer what is left and when all of it is back", () => {
    const { take } = limiterAtStart();
    expect(take("a").headers).toEqual({
      "RateLimit-Policy": '"writes";q=60;w=60',
      RateLimit: '"writes";r=59;t=1',
    });
  });

  it("takes a call again after the seconds that Retry-After names", () => {
    const { clock, take } = limiterAtStart();
    for (let i = 0; i < 60; i += 1) take("a");
    const refused = take("a");
    expect(refused.headers["Retry-After"]).toBe("1");
    clock.ms += Number(refused.headers["Retry-After"]) * 1000;
    expect(take("a").isAllowed).toBe(true);
    expect(take("a").isAllowed).toBe(false);
  });

  it("counts each caller alone", () => {
    const { take } = limiterAtStart();
    for (let i = 0; i < 61; i += 1) take("a");
    expect(take("b").isAllowed).toBe(true);
  });
});

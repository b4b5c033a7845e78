import { describe, expect, it } from "vitest";
import { nextPath } from "@/app/http/next-path.server";

describe("where a sign-in leads", () => {
  it("is the path that was asked for, with its query and fragment", () => {
    expect(nextPath("/submissions/4?tab=files#n32")).toBe("/submissions/4?tab=files#n32");
  });

  it.each([
    "https://elsewhere.example/",
    "//elsewhere.example/",
    "/\\elsewhere.example/",
    "\\\\elsewhere.example",
    "/\t/elsewhere.example/",
    "/\n//elsewhere.example/",
    "/.//elsewhere.example/",
    "/a/..//elsewhere.example/",
    "javascript:alert(1)",
    "elsewhere.example",
    "",
  ])("is never another site, as in %j", (asked) => {
    const path = nextPath(asked);
    expect(new URL(path, "https://here.example").origin).toBe("https://here.example");
    expect(path).toBe("/account");
  });

  it("is the account page where nothing was asked for", () => {
    expect(nextPath(null)).toBe("/account");
  });
});

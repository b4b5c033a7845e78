import { describe, expect, it } from "vitest";
import { joinForm, resetForm, signInForm } from "@/app/features/accounts/account-form";

const newcomer = { name: "Ines Roth", email: "Ines.Roth@Example.org ", password: "seven grey herons" };

describe("the form to join", () => {
  it("stores an e-mail address in lower case without blanks around it", () => {
    expect(joinForm.parse(newcomer).email).toBe("ines.roth@example.org");
  });

  it.each(["", "ines", "ines@", "@example.org", "ines roth@example.org"])(
    "refuses %j as an address",
    (email) => {
      expect(joinForm.safeParse({ ...newcomer, email }).success).toBe(false);
    },
  );

  it("refuses a password of 11 characters and takes any of 12", () => {
    expect(joinForm.safeParse({ ...newcomer, password: "elevenchars" }).success).toBe(false);
    expect(joinForm.safeParse({ ...newcomer, password: "twelve chars" }).success).toBe(true);
    expect(resetForm.safeParse({ password: "elevenchars" }).success).toBe(false);
  });

  it.each(["ines.roth@example.org", "INES.ROTH@EXAMPLE.ORG"])(
    "refuses the address as the password: %s",
    (password) => {
      expect(joinForm.safeParse({ ...newcomer, password }).error?.issues[0].path).toEqual(["password"]);
    },
  );

  it("refuses the name as the password, however it is spaced and capitalised", () => {
    const input = { ...newcomer, name: "Ines Maria Roth", password: "inesMariaROTH" };
    expect(joinForm.safeParse(input).error?.issues[0].path).toEqual(["password"]);
  });

  it("refuses a blank name", () => {
    expect(joinForm.safeParse({ ...newcomer, name: "  " }).success).toBe(false);
  });
});

describe("the form to sign in", () => {
  it("holds no rule about an existing password but that it is given", () => {
    expect(signInForm.safeParse({ email: "a@example.org", password: "x" }).success).toBe(true);
    expect(signInForm.safeParse({ email: "a@example.org", password: "" }).success).toBe(false);
  });
});

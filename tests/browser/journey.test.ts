import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { basename } from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { startApplication, type Application } from "../support/application";
import { openPage, sidewaysOverflow, startBrowser, type Watched } from "../support/browser";
import { useDatabase } from "../support/database";
import { mailsTo } from "../support/mails";
import { makeAccount, submit } from "../support/register";
import { writeStudyFiles, type StudyFiles } from "../support/study-files";
import { until } from "../support/until";

useDatabase();

const nodes = [16, 24, 32, 48, 64, 96];
const password = "seven grey herons";
const email = "ines.roth@example.test";

let application: Application;
let browser: Browser;
let files: StudyFiles;
let author: Watched;
let adminEmail: string;
/** Found on the way, one step after the other. */
let submissionId: string;
let recordPath: string;

beforeAll(async () => {
  await publishShippedProblems();
  adminEmail = (await makeAccount("admin")).email;
  files = writeStudyFiles(nodes);
  application = await startApplication();
  await application.startWorker();
  browser = await startBrowser();
  author = await openPage(browser);
});

afterAll(async () => {
  await browser.close();
  await application.stop();
  files.remove();
});

const open = (page: Page, path: string) => page.goto(application.address + path);

async function signIn(page: Page, address: string, secret: string): Promise<void> {
  await open(page, "/sign-in");
  await page.getByLabel("E-mail").fill(address);
  await page.getByLabel("Password").fill(secret);
  await page.getByRole("main").getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => url.pathname !== "/sign-in");
}

async function fillSolver(page: Page): Promise<void> {
  await page.getByRole("textbox", { name: "Solver", exact: true }).fill("heron-fd2");
  await page.getByLabel("Version").fill("1.4");
  await page.getByLabel("Finite difference", { exact: true }).check();
  await page.getByLabel("Method in a word").fill("central");
  await page.getByLabel("Formal order").fill("2");
}

/** Lets the page believe that the files were dropped on it, the way a desktop hands them over. */
async function dropFiles(page: Page, paths: string[]): Promise<void> {
  const dropped = paths.map((path) => ({ name: basename(path), bytes: [...readFileSync(path)] }));
  const transfer = await page.evaluateHandle((list) => {
    const data = new DataTransfer();
    for (const { name, bytes } of list) data.items.add(new File([new Uint8Array(bytes)], name));
    return data;
  }, dropped);
  await page.getByText("Drop the files here").dispatchEvent("drop", { dataTransfer: transfer });
}

describe("from an author's files to a public record", () => {
  it("somebody joins, and the mail's link verifies the address", async () => {
    const { page } = author;
    await open(page, "/join");
    await page.getByLabel("Name").fill("Ines Roth");
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Password").fill(password);
    await page.getByRole("button", { name: "Make the account" }).click();
    await page.getByText("A mail is on its way").waitFor();

    await until("the mail is delivered", async () => (await mailsTo(email)).length > 0);
    const [mail] = await mailsTo(email);
    const link = /http:\/\/\S+\/verify\/\S+/.exec(mail)?.[0] ?? "";
    expect(new URL(link).origin).toBe(application.address);
    await page.goto(link);
    await page.getByRole("button", { name: "Verify the address" }).click();
    await page.getByText("Your e-mail address is verified").waitFor();
  });

  it("the author signs in and makes a team", async () => {
    const { page } = author;
    await signIn(page, email, password);
    await open(page, "/submit");
    await page.getByRole("link", { name: "Make a team" }).click();
    await page.getByLabel("Name").fill("Harrow Basin Group");
    await page.getByRole("button", { name: "Make the team" }).click();
    await page.getByText("The team Harrow Basin Group is made").waitFor();
  });

  it("chosen files propose their N, a file with a fault is refused at its place, and a file of its name replaces it", async () => {
    const { page } = author;
    await open(page, "/submit?problem=advection-exp-sine");
    await fillSolver(page);
    const send = page.getByRole("button", { name: /^Upload/ });
    expect(await send.isDisabled()).toBe(true);
    await page.getByText(/Before they can be sent: .*choose the files/).waitFor();

    await dropFiles(page, files.paths);
    for (const n of nodes) {
      const field = page.getByLabel(`N of field-N${String(n).padStart(3, "0")}.npy`);
      await until(`N = ${n} is proposed`, async () => (await field.inputValue()) === String(n));
    }
    await page.locator("input[type=file][hidden]").setInputFiles(files.brokenPath);
    await page.getByText(/row 7/i).first().waitFor();
    await page.getByLabel("Place in the file").getByText("nan").waitFor();
    await page.getByText(/replace or remove field-N032\.csv/).waitFor();
    expect(await send.isDisabled()).toBe(true);
    await page.getByRole("button", { name: "Remove field-N032.csv" }).click();
    await until("the files can be sent", async () => send.isEnabled());
    await page.getByText("6 of 6 files scored").waitFor();
  });

  it("leaving with files that were not sent is asked about, and nothing is lost by staying", async () => {
    const { page } = author;
    page.once("dialog", (dialog) => void dialog.dismiss());
    await page.evaluate(() => window.history.back());
    await page.getByLabel("N of field-N016.npy").waitFor();
    expect(await page.getByLabel("Version").inputValue()).toBe("1.4");
  });

  it("an N that the file does not hold is refused beside the file", async () => {
    const { page } = author;
    await page.getByLabel("N of field-N016.npy").fill("17");
    await page.getByText(/The field u has shape \(16,\)/).waitFor();
    await page.getByLabel("N of field-N016.npy").fill("16");
    const send = page.getByRole("button", { name: /^Upload/ });
    await until("the files can be sent again", async () => send.isEnabled());
  });

  it("the submission is scored while its author watches, and handed in", async () => {
    const { page } = author;
    await page.getByLabel("Wall time of field-N096.npy").fill("0.4 ms");
    await page.getByRole("button", { name: /^Upload/ }).click();
    await page.waitForURL(/\/submissions\/[0-9a-f-]{36}$/);
    submissionId = new URL(page.url()).pathname.split("/").at(-1) ?? "";
    // Nothing reloads the page: the events do.
    await page.getByText("Hand in for review").waitFor();
    await page.getByText("confirmed", { exact: true }).waitFor();
    await page.getByText("Hand in for review").click();
    await page.getByRole("button", { name: /^Hand in S-/ }).click();
    await page.getByText("It is in review").waitFor();
    expect(author.faults).toEqual([]);
  });

  it("nobody else sees it before it is listed", async () => {
    const { page } = await openPage(browser);
    const answer = await open(page, `/submissions/${submissionId}`);
    expect(answer?.status()).toBe(404);
    await open(page, "/problems/advection-exp-sine?tolerance=1e-1");
    expect(await page.getByText("heron-fd2").count()).toBe(0);
    await page.context().close();
  });

  it("an admin reads the evidence and lists it with a note", async () => {
    const { page, faults } = await openPage(browser);
    await signIn(page, adminEmail, "a long password");
    await open(page, "/moderation");
    await page.getByText("heron-fd2").waitFor();
    await page.keyboard.press("n");
    await page.keyboard.press("e");
    await page.waitForURL(`**/moderation/${submissionId}`);
    await page.getByLabel(/^Note to the author/).fill("Grids and order as expected.");
    await page.getByRole("button", { name: "List", exact: true }).click();
    await page.waitForURL("**/moderation?decided=*");
    await open(page, "/moderation/log");
    await page.getByRole("rowheader", { name: "submission.listed" }).waitFor();
    expect(faults).toEqual([]);
    await page.context().close();
  });

  it("a visitor sees it ranked, opens the record and downloads a file with the checksum of the author's", async () => {
    const { page, faults } = await openPage(browser);
    await open(page, "/problems/advection-exp-sine?tolerance=1e-1");
    await page
      .getByRole("link", { name: /heron-fd2/ })
      .first()
      .waitFor();
    await open(page, `/submissions/${submissionId}`);
    await page.waitForURL(/\/records\/\d+\/1$/);
    recordPath = new URL(page.url()).pathname;
    const [download] = await Promise.all([
      page.waitForEvent("download"),
      page.getByRole("link", { name: "field-N064.npy" }).first().click(),
    ]);
    const sha256 = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");
    expect(sha256(readFileSync(await download.path()))).toBe(
      sha256(readFileSync(files.pathOf("field-N064.npy"))),
    );
    expect(faults).toEqual([]);
    await page.context().close();
  });

  it("the author withdraws the record with a note, which stands on its page", async () => {
    const { page } = author;
    await open(page, `/submissions/${submissionId}?withdraw`);
    await page.getByLabel(/^Note/).fill("Superseded by a corrected boundary.");
    await page.getByRole("button", { name: "Withdraw the record" }).click();
    await page.waitForURL(`**${recordPath}`);
    await page.getByText("Superseded by a corrected boundary.").first().waitFor();
  });
});

describe("the page to hand in", () => {
  it("keeps files and fields when the server refuses them, and shows the refusal at its field", async () => {
    const { page } = author;
    await open(page, "/submit?problem=advection-exp-sine");
    await fillSolver(page);
    await page.getByLabel("Fourier", { exact: true }).check();
    await dropFiles(page, files.paths);
    const send = page.getByRole("button", { name: /^Upload/ });
    await until("the files can be sent", async () => send.isEnabled());
    await send.click();
    await page.getByText(/is registered with the family finiteDifference/).waitFor();
    await page.getByText(/a solver of another family needs a slug of its own/).waitFor();
    expect(await page.getByRole("textbox", { name: "Solver", exact: true }).inputValue()).toBe("heron-fd2");
    expect(await page.getByLabel("N of field-N096.npy").inputValue()).toBe("96");
    await page.getByRole("textbox", { name: "Solver", exact: true }).fill("heron-fs");
    await send.click();
    await page.waitForURL(/\/submissions\/[0-9a-f-]{36}$/);
  });

  it("leads to a page that names the place in a file that cannot be scored", async () => {
    const account = await makeAccount("author", "Broken Group");
    const { id } = await submit(account, {
      part: {
        problem: "advection-exp-sine",
        solver: { team: "broken-group", solver: "nan", version: "1", family: "other", method: "none" },
        grid: { x: { kind: "uniform-periodic" } },
        dataLicence: "CC0-1.0",
        runs: [{ file: "field-N032.csv", n: [32] }],
      },
      files: { "field-N032.csv": readFileSync(files.brokenPath) },
    });
    const { page } = await openPage(browser);
    await signIn(page, account.email, "a long password");
    await open(page, `/submissions/${id}`);
    await page.getByText("The files cannot be scored").waitFor();
    await page.getByText(/NaN or infinite, the first at index 5/).waitFor();
    await page.context().close();
  });

  it("does not scroll sideways on a phone, with files and a refusal in it", async () => {
    const { page, faults } = await openPage(browser, { width: 390, height: 844 });
    await signIn(page, email, password);
    await open(page, "/submit?problem=advection-exp-sine");
    await page.locator("input[type=file][hidden]").setInputFiles([...files.paths, files.brokenPath]);
    await page.getByText(/row 7/i).first().waitFor();
    expect(await sidewaysOverflow(page)).toBeLessThanOrEqual(0);
    expect(faults).toEqual([]);
    await page.context().close();
  });

  it("works as a plain form where no script runs", async () => {
    const { page } = await openPage(browser, { javaScriptEnabled: false });
    await signIn(page, email, password);
    await open(page, "/submit?problem=advection-exp-sine");
    await fillSolver(page);
    for (const [row, n] of [16, 32, 64].entries()) {
      await page.getByLabel(`File of run ${row + 1}`).setInputFiles(files.paths[nodes.indexOf(n)]);
      await page.getByLabel(`N of run ${row + 1}`).fill(String(n));
    }
    await page.getByLabel("Formal order").fill("");
    await page.getByRole("button", { name: "Upload and score" }).click();
    // Refused: the order is missing. What was typed comes back, but for the files, which a browser never returns.
    expect(await page.getByLabel("Version").inputValue()).toBe("1.4");
    await page.getByLabel("Formal order").fill("2");
    for (const [row, n] of [16, 32, 64].entries()) {
      await page.getByLabel(`File of run ${row + 1}`).setInputFiles(files.paths[nodes.indexOf(n)]);
      await page.getByLabel(`N of run ${row + 1}`).fill(String(n));
    }
    await page.getByRole("button", { name: "Upload and score" }).click();
    await page.waitForURL(/\/submissions\/[0-9a-f-]{36}$/);
    await page.context().close();
  });
});

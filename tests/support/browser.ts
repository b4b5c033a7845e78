import { chromium, type Browser, type Page } from "playwright-core";

/** Debian's Chromium, without its services that would call outside. */
export async function startBrowser(): Promise<Browser> {
  return await chromium.launch({
    executablePath: "/usr/bin/chromium",
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-dev-shm-usage",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
      "--no-first-run",
    ],
  });
}

export interface Watched {
  page: Page;
  /** Errors of scripts and refusals of the content policy so far. */
  faults: string[];
}

/** A page in a session of its own; what goes wrong in its scripts is kept for the test to look at. */
export async function openPage(
  browser: Browser,
  { width = 1440, height = 1000, javaScriptEnabled = true } = {},
): Promise<Watched> {
  const context = await browser.newContext({ viewport: { width, height }, javaScriptEnabled });
  const page = await context.newPage();
  page.setDefaultTimeout(20_000);
  const faults: string[] = [];
  page.on("pageerror", (error) => faults.push(error.message));
  page.on("console", (message) => {
    if (message.type() === "error" && !/status of 4\d\d/.test(message.text())) faults.push(message.text());
  });
  return { page, faults };
}

/** By how much the page is wider than its window. */
export async function sidewaysOverflow(page: Page): Promise<number> {
  return await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
}

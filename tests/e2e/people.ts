import { readFileSync } from "node:fs";
import { expect, type Browser, type BrowserContextOptions, type Page } from "@playwright/test";

interface LogIns {
  readonly password: string;
  readonly people: readonly { readonly email: string }[];
}

const logIns = JSON.parse(
  readFileSync(new URL("../../lib/domain/demo/people.json", import.meta.url), "utf8"),
) as LogIns;

export const PASSWORD = logIns.password;
export const LEADER = "runa@leestead.example";
export const CO_LEADER = "tobi@leestead.example";
export const PARTICIPANT = "kirsi@leestead.example";

/** Signs in as one of the demo people, in a browser of their own. */
export async function openAs(browser: Browser, email: string, options: BrowserContextOptions = {}): Promise<Page> {
  const context = await browser.newContext(options);
  const page = await context.newPage();
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(PASSWORD);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(/\/trips/);
  return page;
}

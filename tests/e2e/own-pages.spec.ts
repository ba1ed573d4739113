import { expect, test, type Page } from "@playwright/test";
import { extractText, getDocumentProxy } from "unpdf";
import { openMail } from "./mail";
import { CO_LEADER, LEADER, openAs, PARTICIPANT } from "./people";

/** A participant and those who lead, each on a phone. */
test.describe.configure({ mode: "serial" });

const PHONE = { viewport: { width: 390, height: 844 }, hasTouch: true };
const TRIP = "Skarn Edge round";

async function openTrip(page: Page): Promise<string> {
  await page.goto("/trips");
  const href = (await page.getByRole("link", { name: TRIP }).getAttribute("href")) ?? "";
  await page.goto(href);
  return href;
}

async function expectNoSidewaysScroll(page: Page): Promise<void> {
  expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0);
}

async function readPages(page: Page, name: string): Promise<{ text: string; pages: number }> {
  const href = (await page.getByRole("link", { name }).first().getAttribute("href")) ?? "";
  const response = await page.request.get(href, { timeout: 60_000 });
  expect(response.status()).toBe(200);
  const document = await getDocumentProxy(new Uint8Array(await response.body()));
  const { text, totalPages } = await extractText(document, { mergePages: true });
  return { text: text.replace(/\s+/g, " "), pages: totalPages };
}

test("a participant sees what changed, pitches by it, and says that they read it", async ({ browser }) => {
  const page = await openAs(browser, PARTICIPANT, PHONE);
  await openTrip(page);
  await expect(page).toHaveURL(/\/mine$/);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(/change.? on your pages/);
  await expect(page.getByText(/trucker's hitch.* now\. Before:/).first()).toBeVisible();
  await expect(page.getByText(/Printed version \d+, now \d+/)).toBeVisible();
  await expectNoSidewaysScroll(page);

  const steps = page.getByRole("list", { name: /^Order of pitching/ }).first();
  const first = steps.getByRole("checkbox").first();
  await first.tap();
  await expect(first).toBeChecked();
  const box = await first.boundingBox();
  expect(box?.width).toBeGreaterThanOrEqual(24);
  await steps
    .getByRole("link", { name: /^Knot: / })
    .first()
    .tap();
  await expect(page).toHaveURL(/#knot-/);
  await expect(page.getByRole("img", { name: /, drawn open$/ }).first()).toBeVisible();

  await page.getByRole("button", { name: "I have read my pages" }).tap();
  await expect(page.getByText("You have read them as they are. Nothing has changed since.")).toBeVisible();

  const flat = await readPages(page, "My pages");
  expect(flat.pages).toBeLessThanOrEqual(4);
  expect(flat.text).toContain("Kirsi Lindqvist");
  expect(flat.text).toMatch(/version \d+/);
  const folded = await readPages(page, "To fold for the pocket");
  expect(folded.pages).toBe(1);
  await page.reload();
  await expect(page.getByText(/Printed version (\d+), .*Up to date/)).toBeVisible();
  await page.context().close();
});

test("the leader calls the co-leader by name in a comment, who gets it by mail and answers", async ({ browser }) => {
  const leader = await openAs(browser, LEADER, PHONE);
  await openTrip(leader);
  const camp =
    (await leader
      .getByRole("link", { name: /Skarn Edge/ })
      .first()
      .getAttribute("href")) ?? "";
  await leader.goto(`${camp}/comments`);
  await leader.getByRole("button", { name: "@Tobi Oduya" }).tap();
  await leader.getByRole("textbox", { name: "Comment" }).pressSequentially("please pull two stakes at the wall.");
  await leader.getByRole("button", { name: "Write the comment" }).tap();
  await expect(leader.getByText("@Tobi Oduya please pull two stakes at the wall.").first()).toBeVisible();
  await expect(leader.getByText("mailed to Tobi Oduya").last()).toBeVisible();
  await expectNoSidewaysScroll(leader);

  const coLeader = await openAs(browser, CO_LEADER, PHONE);
  await openMail(coLeader, CO_LEADER, /wrote to you/);
  await expect(coLeader.getByText(/pull two stakes at the wall/).first()).toBeVisible();
  await coLeader.goto(`${camp}/comments`);
  await expect(coLeader.getByText("please pull two stakes at the wall.").first()).toBeVisible();

  const participant = await openAs(browser, PARTICIPANT, PHONE);
  expect((await participant.goto(`${camp}/comments`))?.status()).toBe(404);
  for (const page of [leader, coLeader, participant]) await page.context().close();
});

test("an earlier staking plan is looked at, brought back, and taken back again", async ({ browser }) => {
  const page = await openAs(browser, LEADER, PHONE);
  const trip = await openTrip(page);
  await page.goto(`${trip}/history`);
  await page.getByLabel("Camp", { exact: true }).selectOption({ label: "Skarn Edge" });
  await page.getByRole("button", { name: "Show", exact: true }).tap();
  const versions = page.getByRole("list", { name: /^Versions of the staking plan/ });
  await expect(versions).toBeVisible();
  const before = await versions.getByRole("listitem").count();
  await versions.getByRole("link", { name: /version 1$/ }).tap();
  await expect(page.getByRole("heading", { name: /tie-outs? would change/ })).toBeVisible();
  await expectNoSidewaysScroll(page);
  await page.getByRole("button", { name: "Bring this plan back" }).tap();
  await page.getByRole("button", { name: "Bring it back" }).tap();
  await expect(page).toHaveURL(/history\?camp=/);
  await expect(versions.getByRole("listitem")).toHaveCount(before + 1);
  await page.goto(page.url().replace(/\?camp=(.*)$/, "/$1/2"));
  await page.getByRole("button", { name: "Bring this plan back" }).tap();
  await page.getByRole("button", { name: "Bring it back" }).tap();
  await expect(versions.getByRole("listitem")).toHaveCount(before + 2);
  await page.context().close();
});

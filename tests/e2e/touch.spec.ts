import { expect, test, type CDPSession, type Page } from "@playwright/test";
import { CO_LEADER, openAs } from "./people";

/** A finger, as the browser itself reports one. */
async function touch(cdp: CDPSession, type: "touchStart" | "touchMove" | "touchEnd", at?: { x: number; y: number }) {
  await cdp.send("Input.dispatchTouchEvent", { type, touchPoints: at ? [at] : [] });
}

async function centreOf(page: Page, selector: ReturnType<Page["getByRole"]>): Promise<{ x: number; y: number }> {
  const box = await selector.boundingBox();
  if (!box) throw new Error("It is not on the screen.");
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}

test("by touch: hold a piece of the tray, draw it onto a tie-out, let go", async ({ browser }) => {
  const page = await openAs(browser, CO_LEADER, { viewport: { width: 1024, height: 1366 }, hasTouch: true });
  const cdp = await page.context().newCDPSession(page);
  await page
    .getByRole("link", { name: /Skarn Edge round/ })
    .first()
    .click();
  const camp = page.getByRole("link", { name: /Alder Bottom/ }).first();
  await page.goto((await camp.getAttribute("href")) ?? "");
  const tray = page.getByRole("region", { name: "Kit tray" });
  const target = page
    .getByLabel(/ from above/)
    .getByRole("button", { name: /^Tie-out 1, / })
    .first();

  // A kind that does not stand there yet, so that the count shows what happened.
  const there = (await target.getAttribute("aria-label")) ?? "";
  const nameOf = (text: string) => /^.*?\d\s*mm/.exec(text)?.[0] ?? text;
  const pieces = tray.getByRole("button", { name: /[1-9]\d* of \d+ left/ });
  const texts = await pieces.allTextContents();
  const index = texts.findIndex((text) => !there.replace(/\s/g, " ").includes(nameOf(text).replace(/\s/g, " ")));
  const piece = pieces.nth(index);
  await piece.scrollIntoViewIfNeeded();
  const before = (await piece.textContent()) ?? "";
  const [, left, of] = /(\d+) of (\d+) left/.exec(before) ?? [];
  const name = nameOf(before).replace(/\s+/g, "\\s+");
  const from = await centreOf(page, piece);
  const to = await centreOf(page, target);
  await touch(cdp, "touchStart", from);
  await page.waitForTimeout(350);
  for (let step = 1; step <= 12; step += 1) {
    await touch(cdp, "touchMove", {
      x: from.x + ((to.x - from.x) * step) / 12,
      y: from.y + ((to.y - from.y) * step) / 12,
    });
    await page.waitForTimeout(20);
  }
  await expect(page.getByText(/is over .*\b1\b/).first()).toBeAttached();
  await touch(cdp, "touchEnd");
  const same = tray.getByRole("button", { name: new RegExp(`^${name}`) }).first();
  await expect(same).toContainText(`${Number(left) - 1} of ${of} left`);
  await page.getByRole("button", { name: "Undo" }).click();
  await expect(same).toContainText(`${left} of ${of} left`);
  await page.context().close();
});

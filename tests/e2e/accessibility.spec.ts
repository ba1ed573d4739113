import AxeBuilder from "@axe-core/playwright";
import { expect, test, type Page } from "@playwright/test";
import { LEADER, openAs, PARTICIPANT } from "./people";

/** Every screen in both themes: no axe violation; no sideways scrolling at 320 px. */
const THEMES = ["day", "night"] as const;
const WIDTHS = { wide: 1440, narrow: 320 } as const;

async function check(page: Page, path: string): Promise<void> {
  const problems: string[] = [];
  for (const theme of THEMES) {
    await page.context().addCookies([{ name: "theme", value: theme, url: new URL(page.url()).origin }]);
    for (const [name, width] of Object.entries(WIDTHS)) {
      const isNarrow = name === "narrow";
      // Colours are the same at both widths: each theme is looked at wide, and the narrow page once.
      if (theme === "night" && isNarrow) continue;
      await page.setViewportSize({ width, height: 900 });
      await page.goto(path);
      await page.locator("main").first().waitFor();
      await expect(page.getByText(/^(Loading|One moment)/)).toHaveCount(0);
      const over = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
      if (over > 0) problems.push(`${theme} ${width}: scrolls sideways by ${over} px`);
      if (isNarrow) continue;
      const { violations } = await new AxeBuilder({ page })
        .withTags(["wcag2a", "wcag2aa", "wcag21aa", "wcag22aa", "best-practice"])
        .analyze();
      for (const one of violations) {
        problems.push(
          `${theme} ${width}: ${one.id}: ${one.nodes
            .map((node) => node.target.join(" "))
            .join(" | ")
            .slice(0, 300)}`,
        );
      }
    }
  }
  expect.soft(problems, path).toEqual([]);
}

test("pages for everybody", async ({ page }) => {
  await page.goto("/");
  for (const path of [
    "/",
    "/sign-in",
    "/sign-up",
    "/forgot-password",
    "/reset-password",
    "/check-mail",
    "/verify",
    "/invitation/none",
    "/nowhere",
    "/demo/mail",
  ]) {
    await check(page, path);
  }
});

test("a leader's pages", async ({ browser }) => {
  test.setTimeout(600_000);
  const page = await openAs(browser, LEADER);
  await page.goto("/trips");
  const trip = (await page.getByRole("link", { name: "Skarn Edge round" }).getAttribute("href")) ?? "";
  await page.goto(trip);
  const camp =
    (await page
      .getByRole("link", { name: /Skarn Edge/ })
      .first()
      .getAttribute("href")) ?? "";
  await page.goto(camp);
  const working =
    (await page.getByRole("link", { name: "How this was calculated" }).first().getAttribute("href")) ?? "";
  await page.goto(`${trip}/shelters`);
  const shelter = (await page.locator(`a[href^="${trip}/shelters/"]`).last().getAttribute("href")) ?? "";
  await page.goto("/pull-tests");
  const practice =
    (await page.locator('a[href^="/pull-tests/"]:not([href$="/compare"])').first().getAttribute("href")) ?? "";
  const parts = [
    "",
    "/pull-tests",
    "/settings",
    "/camps",
    "/camps/new",
    "/shelters",
    "/shelters/new",
    "/shelters/new?kind=bell",
    "/kit",
    "/kit/new",
    "/people",
    "/people/packing",
    "/papers",
    "/history",
    "/post",
    "/mine",
  ];
  for (const path of [
    "/trips",
    "/trips/new",
    "/account",
    "/quick-check",
    "/knots",
    "/gear",
    "/gear/new",
    "/pull-tests",
    "/pull-tests/compare",
    practice,
    ...parts.map((part) => `${trip}${part}`),
    shelter,
    camp,
    `${camp}/place`,
    `${camp}/shelters`,
    `${camp}/comments`,
    `${camp.replace("/camps/", "/history/")}/1`,
    `${camp}/pull-tests`,
    working,
  ]) {
    await check(page, path);
  }
  await page.context().close();
});

test("a leader's pages of the way, the weather, the kit and the people", async ({ browser }) => {
  test.setTimeout(600_000);
  const page = await openAs(browser, LEADER);
  await page.goto("/trips");
  const trip = (await page.getByRole("link", { name: "Skarn Edge round" }).getAttribute("href")) ?? "";
  await page.goto(trip);
  const camp =
    (await page
      .getByRole("link", { name: /Skarn Edge/ })
      .first()
      .getAttribute("href")) ?? "";
  const parts = ["/route", "/kit/find", "/people/contacts", "/emergency", "/details", "/messages"];
  for (const path of [...parts.map((part) => `${trip}${part}`), `${camp}/weather`]) await check(page, path);
  await page.context().close();
});

test("a participant's pages", async ({ browser }) => {
  const page = await openAs(browser, PARTICIPANT);
  await page.goto("/trips");
  const trip = (await page.getByRole("link", { name: "Skarn Edge round" }).getAttribute("href")) ?? "";
  await check(page, `${trip}/mine`);
  await page.context().close();
});

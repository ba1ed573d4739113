import { expect, test, type Locator, type Page } from "@playwright/test";
import { extractText, getDocumentProxy } from "unpdf";
import { openMail } from "./mail";
import { CO_LEADER, LEADER, openAs } from "./people";

/**
 * The whole job as three people: a leader plans a night, a co-leader moves anchors, a participant reads what to do.
 * Clicks only first; then by keyboard and by dragging.
 */
test.describe.configure({ mode: "serial" });

const TRIP = "Fennel Moss weekend";
/** New at every run, so that the tests can be repeated against one server. */
const NEWCOMER = `wren.${Date.now().toString(36)}@leestead.example`;

let leader: Page;
let coLeader: Page;
let newcomer: Page;
let trip = "";
let camp = "";

async function pdfText(page: Page, href: string): Promise<{ text: string; pages: number }> {
  const response = await page.request.get(href);
  expect(response.status()).toBe(200);
  expect(response.headers()["content-type"]).toContain("application/pdf");
  const document = await getDocumentProxy(new Uint8Array(await response.body()));
  const { text, totalPages } = await extractText(document, { mergePages: true });
  return { text: text.replace(/\s+/g, " "), pages: totalPages };
}

const row = (page: Page, number: number): Locator =>
  page.getByRole("listitem").filter({ has: page.getByRole("button", { name: new RegExp(`^Tie-out ${number} `) }) });
const tray = (page: Page, name: string): Locator =>
  page.getByRole("region", { name: "Kit tray" }).getByRole("button", { name: new RegExp(`^${name}`) });
const saved = (page: Page): Locator => page.getByText(/^saved \d\d:\d\d/);

test.beforeAll(async ({ browser }) => {
  leader = await openAs(browser, LEADER, { viewport: { width: 1440, height: 1000 } });
});

test.afterAll(async () => {
  for (const page of [leader, coLeader, newcomer]) await page?.context().close();
});

test("the leader starts a trip with a camp", async () => {
  await leader.getByRole("link", { name: "New trip" }).click();
  await leader.getByLabel("Name of the trip").fill(TRIP);
  await leader.getByLabel("First night").fill("2027-06-12");
  await leader.getByLabel("Time zone").selectOption("Europe/Oslo");
  await leader.getByRole("button", { name: "Start the trip" }).click();
  await expect(leader).toHaveURL(/\/trips\/[0-9a-z]{20,}/);
  trip = new URL(leader.url()).pathname.split("/").slice(0, 3).join("/");

  await leader.goto(`${trip}/camps/new`);
  await leader.getByLabel("Name of the camp").fill("Fennel Moss");
  await leader.getByRole("button", { name: "Add the camp" }).click();
  await expect(leader).toHaveURL(/\/camps\/[0-9a-z]{20,}/);
  camp = new URL(leader.url()).pathname.split("/").slice(0, 5).join("/");
});

test("ground and wind: what is missing is named, a wrong number is told at its field", async () => {
  await leader.goto(`${camp}/place`);
  await leader.getByLabel("Kind of ground").selectOption({ label: "Hard trodden loam" });
  await leader.getByRole("radio", { name: /^Gust/ }).check();
  await leader.getByLabel("Gust", { exact: false }).last().fill("4000");
  await leader.getByRole("radio", { name: /^Open country/ }).check();
  await leader.getByLabel("Altitude").fill("310");
  await leader.getByLabel("It may come from anywhere").uncheck();
  await leader.getByLabel("From, °").fill("240");
  await leader.getByLabel("Clockwise to, °").fill("300");
  await leader.getByLabel("Strong wind lasts").fill("2");
  await leader.getByRole("button", { name: "Save ground and wind" }).click();
  await expect(leader.getByText(/The gust has to be between/)).toBeVisible();
  await expect(leader.getByLabel("Altitude")).toHaveValue("310");

  await expect(leader.getByText("Choose how wet the ground is.")).toBeVisible();
  await leader.getByLabel("How wet").first().selectOption("usual");
  await leader.getByRole("textbox", { name: "Gust" }).fill("50");
  await leader.getByRole("button", { name: "Save ground and wind" }).click();
  await expect(leader.getByText(/^Saved/i).first()).toBeVisible();
});

test("a shelter from the library, pitched, with its sleepers", async () => {
  await leader.goto(`${trip}/shelters/new?kind=ridge-tarp`);
  await leader.getByLabel("Name", { exact: true }).fill("Big tarp");
  await leader.getByRole("button", { name: "Add the shelter" }).click();
  await expect(leader.getByRole("heading", { name: "Big tarp" })).toBeVisible();

  await leader.goto(`${camp}/shelters`);
  await leader.getByRole("button", { name: /^Pitch Big tarp/ }).click();
  const place = leader.getByRole("region", { name: "Big tarp" });
  await expect(place).toBeVisible();
  await leader.getByRole("button", { name: "Runa Amsel", exact: true }).click();
  await leader.getByRole("button", { name: "Put Runa Amsel here" }).first().click();
  await expect(place.getByText("1 of 3 places")).toBeVisible();
  await expect(leader.getByText(/^saved/i).first()).toBeVisible();
});

test("a kit from the library", async () => {
  await leader.goto(`${trip}/kit/new`);
  for (const [name, count] of [
    ["Three-blade, 200 mm", "6"],
    ["Wide sand stake, 300 mm", "4"],
    ["Round hook, 180 mm", "2"],
  ] as const) {
    await leader.getByLabel(`How many ${name}`).fill(count);
    await leader.getByRole("button", { name: `Add ${name}` }).click();
    await expect(leader.getByText(`${count} in the kit`).first()).toBeVisible();
  }
});

test("the proposal fills the plan and every margin can be opened to its working", async () => {
  await leader.goto(camp);
  await expect(leader.getByRole("heading", { name: "Fennel Moss" })).toBeVisible();
  await expect(leader.getByText(/no anchor/i).first()).toBeVisible();
  await leader.getByRole("button", { name: "Propose plan" }).click();
  await expect(leader.getByText(/^(holds to|thin|gives way)/).first()).toBeVisible();
  await expect(saved(leader)).toBeVisible();
  await expect(tray(leader, "Wide sand stake, 300 mm")).toContainText("0 of 4 left");

  await leader.getByRole("link", { name: "How this was calculated" }).first().click();
  await expect(leader).toHaveURL(/\/working\//);
  await expect(leader.getByText("EN 1991-1-4", { exact: false }).first()).toBeVisible();
  await expect(leader.getByRole("heading", { level: 1 })).toBeVisible();
});

test("people: a co-leader with an account, a newcomer by invitation", async ({ browser }) => {
  await leader.goto(`${trip}/people`);
  await leader.getByLabel("Name", { exact: true }).fill("Tobi Oduya");
  await leader.getByLabel("E-mail address").fill(CO_LEADER);
  await leader.getByRole("radio", { name: /^Co-leader/ }).check();
  await leader.getByRole("button", { name: "Add and invite" }).click();
  await expect(leader.getByText(CO_LEADER, { exact: true })).toBeVisible();
  await leader.getByLabel("Name", { exact: true }).fill("Wren Okafor");
  await leader.getByLabel("E-mail address").fill(NEWCOMER);
  await leader.getByRole("radio", { name: /^Participant/ }).check();
  await leader.getByRole("button", { name: "Add and invite" }).click();
  await expect(leader.getByText(NEWCOMER, { exact: true })).toBeVisible();

  newcomer = await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage();
  await openMail(newcomer, NEWCOMER, new RegExp(TRIP));
  const link = await newcomer
    .getByRole("link", { name: /\/invitation\// })
    .first()
    .getAttribute("href");
  await newcomer.goto(link ?? "");
  await newcomer.getByLabel("Password", { exact: true }).fill("a-quiet-place-in-the-lee");
  await newcomer.getByRole("button", { name: "Join the trip" }).click();
  await expect(newcomer).toHaveURL(/\/(trips|sign-in)/);
  if (newcomer.url().includes("/sign-in")) {
    await newcomer.getByLabel("E-mail").fill(NEWCOMER);
    await newcomer.getByLabel("Password", { exact: true }).fill("a-quiet-place-in-the-lee");
    await newcomer.getByRole("button", { name: "Sign in" }).click();
  }
  await newcomer.goto(trip);
  await expect(newcomer).toHaveURL(`${trip}/mine`);
  await expect((await newcomer.goto(link ?? ""))?.status()).toBe(200);
  await expect(newcomer.getByText(/can't be used/)).toBeVisible();
});

test("everybody gets a place by clicks; nobody is forgotten", async () => {
  await leader.goto(`${camp}/shelters`);
  for (const name of ["Tobi Oduya", "Wren Okafor"]) {
    await leader.getByLabel(`Where ${name} sleeps`).selectOption({ label: "Big tarp" });
  }
  await expect(leader.getByRole("region", { name: "Big tarp" }).getByText("3 of 3 places, full")).toBeVisible();
  await expect(leader.getByRole("heading", { name: "Everybody has a place" })).toBeVisible();
  await expect(leader.getByText(/^saved/i).first()).toBeVisible();
});

test("the co-leader moves anchors by clicks only, undoes and redoes", async ({ browser }) => {
  coLeader = await openAs(browser, CO_LEADER, { viewport: { width: 1440, height: 1000 } });
  await coLeader.goto(camp);
  await row(coLeader, 1).getByRole("button").first().click();
  await coLeader.getByRole("button", { name: "To the tray" }).click();
  await expect(row(coLeader, 1)).toContainText("No anchor yet");
  await coLeader.getByRole("button", { name: "Put Round hook, 180 mm at tie-out 1" }).click();
  await expect(row(coLeader, 1)).toContainText("Round hook, 180 mm");
  await coLeader.getByRole("button", { name: "Undo" }).click();
  await expect(row(coLeader, 1)).toContainText("No anchor yet");
  await coLeader.getByRole("button", { name: "Redo" }).click();
  await expect(row(coLeader, 1)).toContainText("Round hook, 180 mm");
  await expect(saved(coLeader)).toBeVisible();
  await coLeader.reload();
  await row(coLeader, 1).getByRole("button").first().click();
  await expect(row(coLeader, 1)).toContainText("Round hook, 180 mm");
});

test("by keyboard: a piece is taken from the tray, carried to a tie-out and put down", async () => {
  const piece = tray(coLeader, "Round hook, 180 mm");
  await expect(piece).toContainText("1 of 2 left");
  await piece.focus();
  await coLeader.keyboard.press("Space");
  await expect(coLeader.getByText(/picked up/i).first()).toBeAttached();
  await coLeader.waitForTimeout(150);
  for (const number of [1, 2]) {
    await coLeader.keyboard.press("ArrowRight");
    await expect(coLeader.getByText(new RegExp(`is over .*\\b${number}\\b`)).first()).toBeAttached();
    await coLeader.waitForTimeout(150);
  }
  await coLeader.keyboard.press("Space");
  await expect(piece).toContainText("0 of 2 left");
  await coLeader.getByRole("button", { name: "Undo" }).click();
  await expect(piece).toContainText("1 of 2 left");
});

test("by dragging: from the tray onto a tie-out of the drawing, with the margin following", async () => {
  const piece = tray(coLeader, "Round hook, 180 mm");
  const target = coLeader.getByLabel(/^Big tarp from above/).getByRole("button", { name: /^Tie-out 3, / });
  await coLeader.evaluate(() => window.scrollTo(0, 0));
  const from = await piece.boundingBox();
  const to = await target.boundingBox();
  if (!from || !to) throw new Error("Nothing to drag.");
  await coLeader.mouse.move(from.x + 40, from.y + 20);
  await coLeader.mouse.down();
  await coLeader.mouse.move(from.x + 60, from.y + 10, { steps: 4 });
  await coLeader.mouse.move(to.x + to.width / 2, to.y + to.height / 2, { steps: 12 });
  await coLeader.waitForTimeout(200);
  await coLeader.mouse.up();
  await expect(piece).toContainText("0 of 2 left");
  await expect(saved(coLeader)).toBeVisible();
});

test("two people on one plan: the second is told who changed what, and chooses", async () => {
  await leader.goto(camp);
  await row(leader, 3).getByRole("button").first().click();
  await expect(row(leader, 3)).toContainText("Round hook, 180 mm");
  // The co-leader changes the same tie-out while the leader's page still shows the older plan.
  await row(coLeader, 3).getByRole("button").first().click();
  await row(coLeader, 3).getByRole("button", { name: "To the tray" }).click();
  await expect(row(coLeader, 3)).toContainText("No anchor yet");
  await expect(saved(coLeader)).toBeVisible();
  await coLeader.waitForTimeout(500);
  await row(leader, 3).getByLabel("Pinned").check();
  const dialog = leader.getByRole("dialog");
  await expect(dialog).toContainText("Tobi Oduya");
  await dialog.getByRole("button", { name: /Take theirs/ }).click();
  await expect(row(leader, 3)).toContainText("No anchor yet");
});

test("cards: what is printed is the plan, and it arrives by mail as the participant's own pages", async () => {
  await leader.goto(camp);
  await leader.getByRole("button", { name: "Propose plan" }).click();
  await expect(tray(leader, "Wide sand stake, 300 mm")).toContainText("0 of 4 left");
  await expect(saved(leader)).toBeVisible();
  await leader.goto(`${trip}/papers`);
  const card = await leader.getByRole("link", { name: "Field card" }).first().getAttribute("href");
  const field = await pdfText(leader, card ?? "");
  for (const word of [TRIP, "Fennel Moss", "Big tarp", "hard trodden loam", "50 km/h"]) {
    expect(field.text).toContain(word);
  }

  await leader.getByRole("button", { name: "Nobody" }).first().click();
  await leader.getByRole("checkbox", { name: /Wren Okafor/ }).check();
  await leader.getByRole("button", { name: "Send to 1 person" }).click();
  await openMail(newcomer, NEWCOMER, /your cards/);
  const attachments = newcomer.getByRole("link", { name: /\.pdf/ });
  await expect(attachments.first()).toBeVisible();
  const texts: string[] = [];
  for (const link of await attachments.all()) {
    const href = await link.getAttribute("href");
    texts.push((await pdfText(newcomer, href ?? "")).text);
  }
  const all = texts.join("\n");
  for (const word of ["Wren Okafor", "Fennel Moss", "Big tarp", "Sleeping bag"]) expect(all).toContain(word);

  await leader.goto(`${trip}/post`);
  await expect(leader.getByRole("list", { name: "Messages" })).toContainText("Wren Okafor");
  await expect(leader.getByText(/^sent/i).first()).toBeVisible();
});

test("the participant sees where they sleep, ticks their list, and nothing of the plan", async () => {
  await newcomer.goto(`${trip}/mine`);
  await expect(newcomer.getByText("Big tarp").first()).toBeVisible();
  await newcomer.getByRole("checkbox", { name: /Sleeping bag/ }).check();
  await newcomer.waitForTimeout(500);
  await newcomer.reload();
  await expect(newcomer.getByRole("checkbox", { name: /Sleeping bag/ })).toBeChecked();
  expect((await newcomer.goto(camp))?.status()).toBe(404);
  expect((await newcomer.goto(`${trip}/people`))?.status()).toBe(404);
});

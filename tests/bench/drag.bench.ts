import { chromium, type Page } from "@playwright/test";
import type { Bench } from "./run";
import { serveProduct, signIn } from "./served/server";

interface Frames {
  readonly deltasMs: readonly number[];
  readonly longTasksMs: readonly number[];
}

/** Runs in the page: frame times and tasks over 50 ms until `stopFrames` is called. */
function startFrames(): void {
  const store = window as unknown as { stopFrames: () => Frames };
  const deltasMs: number[] = [];
  const longTasksMs: number[] = [];
  const observer = new PerformanceObserver((list) => {
    for (const entry of list.getEntries()) longTasksMs.push(entry.duration);
  });
  observer.observe({ entryTypes: ["longtask"] });
  let last = performance.now();
  let isRunning = true;
  const frame = (now: number) => {
    deltasMs.push(now - last);
    last = now;
    if (isRunning) requestAnimationFrame(frame);
  };
  requestAnimationFrame(frame);
  store.stopFrames = () => {
    isRunning = false;
    observer.disconnect();
    return { deltasMs: deltasMs.slice(1), longTasksMs };
  };
}

const quantile = (values: readonly number[], share: number): number =>
  values.toSorted((a, b) => a - b)[Math.floor(values.length * share)] ?? Number.NaN;

/** A piece of the tray drawn over the whole drawing in 60 moves, 60 moves a second. */
async function dragOnce(page: Page): Promise<Frames> {
  const piece = page
    .getByRole("region", { name: "Kit tray" })
    .getByRole("button", { name: /[1-9]\d* of \d+ left/ })
    .first();
  const from = await piece.boundingBox();
  const to = await page
    .getByLabel(/ from above/)
    .first()
    .boundingBox();
  if (!from || !to) throw new Error("Nothing to drag.");
  await page.mouse.move(from.x + 30, from.y + 20);
  await page.mouse.down();
  await page.mouse.move(from.x + 50, from.y + 10, { steps: 4 });
  await page.evaluate(startFrames);
  for (let move = 0; move < 60; move += 1) {
    await page.mouse.move(to.x + (to.width * move) / 60, to.y + to.height * (0.2 + 0.6 * ((move % 20) / 20)));
    await page.waitForTimeout(16);
  }
  const frames = await page.evaluate(() => (window as unknown as { stopFrames: () => Frames }).stopFrames());
  await page.keyboard.press("Escape");
  await page.mouse.up();
  return frames;
}

/** Frame times while a piece is dragged over the drawing, in Debian's Chromium without a graphics card. */
const bench: Bench = async (report) => {
  const product = await serveProduct(3293);
  const executablePath = process.env.CHROMIUM ?? "/usr/bin/chromium";
  const browser = await chromium.launch({ executablePath, args: ["--no-sandbox", "--disable-gpu"] });
  try {
    const context = await browser.newContext({ viewport: { width: 1440, height: 1000 } });
    const cookie = await signIn(product.url, "runa@leestead.example");
    await context.addCookies(
      cookie.split("; ").map((pair) => {
        const [name = "", ...value] = pair.split("=");
        return { name, value: value.join("="), url: product.url };
      }),
    );
    const page = await context.newPage();
    await page.goto(`${product.url}/trips`);
    await page
      .getByRole("link", { name: /Skarn Edge round/ })
      .first()
      .click();
    const camp = await page.locator("a[href*='/camps/']").first().getAttribute("href");
    await page.goto(`${product.url}${camp ?? ""}`);
    await page.getByRole("region", { name: "Kit tray" }).waitFor();
    await page.waitForTimeout(2000);
    const session = await context.newCDPSession(page);
    for (const slowdown of [1, 4]) {
      await session.send("Emulation.setCPUThrottlingRate", { rate: slowdown });
      await dragOnce(page);
      const { deltasMs, longTasksMs } = await dragOnce(page);
      const over = longTasksMs.filter((ms) => ms > 100).length;
      report({
        name: `frames while dragging, processor ${slowdown} × slower`,
        value: `p50 ${quantile(deltasMs, 0.5).toFixed(1)} ms, p95 ${quantile(deltasMs, 0.95).toFixed(1)} ms; tasks over 100 ms: ${over}`,
        target: slowdown === 1 ? "p95 ≤ 17 ms, none" : "p95 ≤ 33 ms, none",
      });
    }
  } finally {
    await browser.close();
    await product.stop();
  }
};

export default bench;

import { median } from "../timing.mjs";

const FILMS = 20;
const KEYS = 41;

/**
 * The work of the page's thread for each key that is typed into the silicon thickness of a stack of 20 films, live figures, cut and
 * chart included, and the longest time between two frames while that goes on: 16.7 ms is a screen's own pace.
 *
 * @param {import("./signed-in.mjs").SignedIn} person
 * @returns {Promise<{ work: number, frame: number, worstFrame: number }>} ms a key: medians, and of frames the worst too
 */
export async function editorFrames({ context }) {
  const page = await context.newPage();
  await page.goto("/stacks", { waitUntil: "networkidle" });
  await page.locator('main table a[href^="/stacks/"]').first().click();
  await page.locator('html[data-scripts="at work"]').waitFor();
  const copies = page.getByRole("button", { name: /^Duplicate: / });
  for (let films = await copies.count(); films < FILMS; films += 1) {
    await copies.first().click({ force: true });
    await page.waitForTimeout(60);
  }
  const silicon = page.getByLabel("Remaining silicon");
  await silicon.fill("100 µm");
  await page.waitForTimeout(2000);
  const device = await context.newCDPSession(page);
  await device.send("Performance.enable");
  const busy = async () => {
    const { metrics } = await device.send("Performance.getMetrics");
    return 1e3 * (metrics.find(({ name }) => name === "TaskDuration")?.value ?? 0);
  };
  await page.evaluate(() => {
    globalThis.longest = 0;
    let last = performance.now();
    const tick = (now) => {
      globalThis.longest = Math.max(globalThis.longest, now - last);
      last = now;
      requestAnimationFrame(tick);
    };
    requestAnimationFrame(tick);
  });
  const times = [];
  const frames = [];
  for (let n = 0; n < KEYS; n += 1) {
    const start = await busy();
    await page.evaluate(() => (globalThis.longest = 0));
    await silicon.press(n % 2 === 0 ? "End" : "Home");
    await silicon.fill(`${60 + n} µm`);
    await page.waitForTimeout(150);
    times.push((await busy()) - start);
    frames.push(await page.evaluate(() => globalThis.longest));
  }
  await page.close();
  return { work: median(times), frame: median(frames), worstFrame: Math.max(...frames) };
}

/** As a laptop slows down for a phone of the middle kind. */
const SLOWER = 4;
/** Interactions shorter than this are not told by the browser, ms. */
const LEAST = 16;

/**
 * Opens a page as a slow device does, presses and types what its first parts offer, and leaves nothing behind.
 *
 * @param {import("./signed-in.mjs").SignedIn} person
 * @param {string} path
 * @returns {Promise<{ shift: number, wait: number }>} layout shift of the page as it comes (its sum), and the longest time from a press
 *   or a key to the next picture, ms
 */
export async function interactions({ context }, path) {
  const page = await context.newPage();
  await page.addInitScript((least) => {
    const seen = { shift: 0, wait: 0 };
    globalThis.seen = seen;
    const watch = (type, tell, options) =>
      new PerformanceObserver((list) => list.getEntries().forEach(tell)).observe({ type, buffered: true, ...options });
    watch("layout-shift", (entry) => {
      if (!entry.hadRecentInput) seen.shift += entry.value;
    });
    watch(
      "event",
      (entry) => {
        if (entry.interactionId > 0) seen.wait = Math.max(seen.wait, entry.duration);
      },
      { durationThreshold: least },
    );
  }, LEAST);
  const device = await context.newCDPSession(page);
  await device.send("Emulation.setCPUThrottlingRate", { rate: SLOWER });
  await page.goto(path, { waitUntil: "networkidle" });
  await page.waitForTimeout(1500);
  const { shift } = await page.evaluate(() => globalThis.seen);
  await page.keyboard.press("Tab");
  await page.keyboard.press("Tab");
  for (const summary of (await page.locator("main summary:visible").all()).slice(0, 2)) {
    await summary.click();
    await page.waitForTimeout(200);
    await summary.click();
  }
  const field = page
    .locator('main input:visible:not([type="checkbox"], [type="radio"], [type="file"], [type="range"])')
    .first();
  if (await field.count()) {
    await field.click();
    for (const key of "12ab") {
      await page.keyboard.press(key);
      await page.waitForTimeout(150);
    }
  }
  await page.waitForTimeout(700);
  const { wait } = await page.evaluate(() => globalThis.seen);
  page.on("dialog", (dialog) => void dialog.accept());
  await page.close();
  return { shift, wait };
}

import { chromium } from "@playwright/test";
import { findChromium } from "../chromium.mjs";
import { bundled } from "./bundle.mjs";

/**
 * The chart's sweep in a real browser: 200 thicknesses of each stack, shape included.
 *
 * @param {object[]} stacks
 * @returns {Promise<{ first: number, least: number } | null>} s: of the first run, which solves the shapes that it meets, and the
 *   shortest of later ones; null where there is no Chromium
 */
export async function sweepInBrowser(stacks) {
  const executablePath = findChromium();
  if (!executablePath) return null;
  const { code } = await bundled({ "stack/thickness-sweep.ts": ["thicknessSweep"] }, "iife");
  const browser = await chromium.launch({ executablePath, args: ["--no-sandbox"] });
  try {
    const page = await browser.newPage();
    await page.addScriptTag({ content: code });
    const times = await page.evaluate((all) => {
      const { thicknessSweep } = globalThis.live;
      return Array.from({ length: 40 }, () => {
        const start = performance.now();
        for (const stack of all) thicknessSweep(stack, { from: 30e-6, to: 775e-6, points: 200 });
        return performance.now() - start;
      });
    }, stacks);
    return { first: (times[0] ?? NaN) / 1e3, least: Math.min(...times.slice(1)) / 1e3 };
  } finally {
    await browser.close();
  }
}

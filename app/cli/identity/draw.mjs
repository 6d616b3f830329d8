/**
 * Draws the pictures of the product's own look that must be points rather than lines: the card that a link to Planeward unfolds
 * into, and the icons of a device's home screen. `npm run identity` after a change of `social-card.svg` or of the mark.
 */
import { readFileSync, writeFileSync } from "node:fs";
import { chromium } from "@playwright/test";
import { findChromium } from "../chromium.mjs";

const root = new URL("../../../", import.meta.url);
const text = (/** @type {string} */ path) => readFileSync(new URL(path, root), "utf8");
const font = (/** @type {number} */ weight) => {
  const file = new URL(`node_modules/@fontsource/noto-sans/files/noto-sans-latin-${weight}-normal.woff2`, root);
  const source = `data:font/woff2;base64,${readFileSync(file).toString("base64")}`;
  return `@font-face { font-family: "Noto Sans"; font-weight: ${weight}; src: url("${source}"); }`;
};

const FONTS = [400, 500, 600].map(font).join("\n");
const MARK = text("public/mark.svg");
const PICTURES = [
  { file: "social-card.png", svg: text("app/cli/identity/social-card.svg"), width: 1200, height: 630 },
  ...[72, 180, 512].map((side) => ({ file: `icon-${side}.png`, svg: MARK, width: side, height: side })),
];

const browser = await chromium.launch({ executablePath: findChromium(), args: ["--no-sandbox"] });
try {
  for (const { file, svg, width, height } of PICTURES) {
    const page = await browser.newPage({ viewport: { width, height } });
    await page.setContent(
      `<style>${FONTS} body { margin: 0; background: #faf8f3 } svg { display: block; width: ${width}px; height: ${height}px }</style>${svg}`,
    );
    await page.evaluate(() => document.fonts.ready);
    writeFileSync(new URL(`public/${file}`, root), await page.screenshot());
    await page.close();
  }
} finally {
  await browser.close();
}

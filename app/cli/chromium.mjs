import { existsSync } from "node:fs";

/** Debian's package of the browser without its window. */
export const chromiumPackage = "chromium-headless-shell";

/**
 * Debian's browser, Playwright brings none of its own here: without its window, which takes a third less time, or else with it.
 *
 * @returns {string | undefined}
 */
export const findChromium = () => [`/usr/bin/${chromiumPackage}`, "/usr/bin/chromium"].find(existsSync);

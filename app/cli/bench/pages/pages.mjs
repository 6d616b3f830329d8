import { chromium } from "@playwright/test";
import { findChromium } from "../../chromium.mjs";
import { addresses } from "./addresses.mjs";
import { editorFrames } from "./editor-frames.mjs";
import { interactions } from "./interactions.mjs";
import { lighthouse } from "./lighthouse.mjs";
import { scriptSize } from "./script-size.mjs";
import { signedIn } from "./signed-in.mjs";

const kB = (/** @type {number} */ bytes) => `${(bytes / 1e3).toFixed(0)} kB`;

/**
 * The pages of a copy that runs already (`npm start`), as its engineer gets them in a real browser: script, layout shift, the longest
 * wait for an interaction with the processor slowed down four times, frames while somebody types into a large stack, Lighthouse.
 */
export async function pages() {
  const browser = await chromium.launch({ executablePath: findChromium(), args: ["--no-sandbox"] });
  try {
    const person = await signedIn(browser);
    const found = await addresses(person);
    console.log(
      "Page: script (gzip); shift of the layout (wanted < 0.02); longest wait at a quarter speed (wanted < 100 ms)",
    );
    for (const [name, path] of Object.entries(found)) {
      const size = await scriptSize(person, path);
      const { shift, wait } = await interactions(person, path);
      console.log(
        `${name}: ${kB(size.before)}, ${kB(size.after)} once used; ${shift.toFixed(3)}; ${wait.toFixed(0)} ms`,
      );
    }
    const { work, frame, worstFrame } = await editorFrames(person);
    console.log(
      `A thickness typed with 20 films: longest frame ${frame.toFixed(1)} ms, at worst ${worstFrame.toFixed(1)} ms (a screen's pace is 16.7 ms); ${work.toFixed(0)} ms of work in all, figures, cut and chart`,
    );
    for (const [name, path] of Object.entries(found)) {
      const { performance, accessibility, practices } = await lighthouse(person, path);
      console.log(`${name}: Lighthouse ${performance}, ${accessibility}, ${practices} (wanted 95, 100, 100)`);
    }
  } finally {
    await browser.close();
  }
}

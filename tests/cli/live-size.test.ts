/* What a page loads to compute while somebody types: small enough, and the engine alone. */
import { describe, expect, it } from "vitest";

type Parts = Record<string, string[]>;

// The commands are plain scripts without type declarations.
const bundle: string = new URL("../../app/cli/bench/bundle.mjs", import.meta.url).href;
const { bundleSize, FLOW_PAGE, STACK_PAGE } = (await import(bundle)) as {
  bundleSize: (parts: Parts) => Promise<{ gzip: number; packages: string[] }>;
  FLOW_PAGE: Parts;
  STACK_PAGE: Parts;
};

describe("the engine's live part, with units and limits", () => {
  it.each([
    ["of a stack", STACK_PAGE, 30e3],
    ["of a flow", FLOW_PAGE, 60e3],
  ])("%s brings no package along and stays under its bound", { timeout: 60_000 }, async (_, parts, most) => {
    const { gzip, packages } = await bundleSize(parts);
    expect(packages).toEqual([]);
    expect(gzip).toBeLessThan(most);
  });
});

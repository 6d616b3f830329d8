import { gzipSync } from "node:zlib";
import { build } from "vite";

/** `run.mjs` runs the bench, itself bundled, from there. */
const root = `${process.cwd()}/`;

/** What pages need to compute while somebody types, by module of the engine. */
const UNITS = {
  "units/parse-quantity.ts": ["parseQuantity"],
  "units/format.ts": ["formatQuantity", "formatWithUncertainty"],
};
const LIMITS = { "rules/limits.ts": ["defaultLimits", "LIMIT_DEFINITIONS"] };
export const STACK_PAGE = {
  "stack/estimate-stack.ts": ["estimateStack"],
  "stack/stack-support.ts": ["stackSupport"],
  "stack/thickness-sweep.ts": ["curlingThickness", "thicknessSweep"],
  "stack/warp-uncertainty.ts": ["warpUncertainty"],
  ...LIMITS,
  ...UNITS,
};
export const FLOW_PAGE = { "flow/judge.ts": ["judgeFlow"], ...LIMITS, ...UNITS };
/** All of it, for somebody who goes from one page to the other. */
export const LIVE = { ...STACK_PAGE, ...FLOW_PAGE };

const ENTRY = "virtual:live";

/**
 * Modules of the engine as the browser gets them, bundled by the program that bundles the client.
 *
 * @param {Record<string, string[]>} parts names to export, by module of the engine
 * @param {"es" | "iife"} format `iife` puts what is exported into the global `live`
 */
export async function bundled(parts, format = "es") {
  const lines = Object.entries(parts).map(
    ([path, names]) => `export { ${names.join(", ")} } from ${JSON.stringify(`${root}app/engine/${path}`)};`,
  );
  const built = await build({
    root,
    configFile: false,
    logLevel: "silent",
    plugins: [
      {
        name: "live",
        resolveId: (id) => (id === ENTRY ? id : null),
        load: (id) => (id === ENTRY ? lines.join("\n") : null),
      },
    ],
    build: {
      write: false,
      target: "es2022",
      rollupOptions: { input: ENTRY, preserveEntrySignatures: "strict", output: { format, name: "live" } },
    },
  });
  const chunks = [built].flat().flatMap(({ output }) => output.filter(({ type }) => type === "chunk"));
  return {
    code: chunks.map(({ code }) => code).join(""),
    modules: chunks.flatMap((chunk) => Object.keys(chunk.modules)),
  };
}

/**
 * Size of a part of the engine in the browser.
 *
 * @param {Record<string, string[]>} parts as for `bundled`
 * @returns {Promise<{ gzip: number, plain: number, packages: string[] }>} bytes; `packages` are modules from outside the project
 */
export async function bundleSize(parts) {
  const { code, modules } = await bundled(parts);
  const packages = modules.filter((id) => id.includes("node_modules"));
  return { gzip: gzipSync(code, { level: 9 }).length, plain: code.length, packages };
}

import { gzipSync } from "node:zlib";
import { build } from "vite";

/** `run.mjs` runs the bench, itself bundled, from there. */
const root = `${process.cwd()}/`;

/** What a page needs to compute while somebody types, by module of the engine. */
const LIVE = {
  "stack/estimate-stack.ts": ["estimateStack"],
  "stack/thickness-sweep.ts": ["thicknessSweep"],
  "flow/assess.ts": ["assessFlow"],
  "rules/limits.ts": ["defaultLimits", "LIMIT_DEFINITIONS"],
  "units/parse-quantity.ts": ["parseQuantity"],
  "units/format.ts": ["formatQuantity", "formatWithUncertainty"],
};

const lines = Object.entries(LIVE).map(
  ([path, names]) => `export { ${names.join(", ")} } from ${JSON.stringify(`${root}app/engine/${path}`)};`,
);

const ENTRY = "virtual:live";

/**
 * Size of the engine's live part as the browser gets it, bundled by the program that bundles the client, and how much of it are
 * packages.
 *
 * @returns {Promise<{ gzip: number, plain: number, packages: number }>} bytes; `packages` a share before minifying, 0 to 1
 */
export async function liveBundle() {
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
      rollupOptions: { input: ENTRY, preserveEntrySignatures: "strict", output: { format: "es" } },
    },
  });
  const chunks = [built].flat().flatMap(({ output }) => output.filter(({ type }) => type === "chunk"));
  const code = chunks.map((chunk) => chunk.code).join("");
  const modules = chunks.flatMap((chunk) => Object.entries(chunk.modules));
  const length = (list) => list.reduce((sum, [, { renderedLength }]) => sum + renderedLength, 0);
  const packages = length(modules.filter(([id]) => id.includes("node_modules"))) / length(modules);
  return { gzip: gzipSync(code, { level: 9 }).length, plain: code.length, packages };
}

/**
 * Builds the bench as the product is built, by vite, and runs it in a plain Node. The loader that runs TypeScript unbuilt hands
 * buffers from thread to thread, and once one was handed over V8 asks at every access to a typed array whether it is still
 * there: that costs the engine's innermost loop a quarter (measured), and belongs to the loader.
 */
import { spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";
import { build } from "vite";

const root = fileURLToPath(new URL("../../../", import.meta.url));
// Inside node_modules, so that what stays a package is found from there.
const outDir = `${root}node_modules/.cache/bench`;

await build({
  root,
  configFile: false,
  logLevel: "warn",
  build: {
    ssr: fileURLToPath(new URL("bench.mjs", import.meta.url)),
    outDir,
    emptyOutDir: true,
    target: "es2022",
    rollupOptions: { output: { format: "es", entryFileNames: "bench.mjs" } },
  },
});
const { status } = spawnSync(process.execPath, [`${outDir}/bench.mjs`, ...process.argv.slice(2)], {
  cwd: root,
  stdio: "inherit",
});
process.exitCode = status ?? 1;

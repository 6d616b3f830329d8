import { createWriteStream, mkdtempSync, rmSync } from "node:fs";
import { once } from "node:events";
import { tmpdir } from "node:os";
import { join } from "node:path";

export const ROWS = 1_000_000;
/** Curvature of the scan in the file, 1/m. */
export const CURVATURE = 0.011;

/**
 * A scan of 190 mm in a million rows, mm and µm, with scatter of some 35 nm, for as long as `work` takes.
 *
 * @template T
 * @param {(path: string) => Promise<T> | T} work
 * @returns {Promise<T>}
 */
export async function withScanFile(work) {
  const folder = mkdtempSync(join(tmpdir(), "planeward-bench-"));
  try {
    const path = join(folder, "scan.csv");
    const file = createWriteStream(path);
    file.write("x (mm),z (um)\n");
    for (let low = 0; low < ROWS; low += 10_000) {
      let piece = "";
      for (let n = low; n < low + 10_000; n += 1) {
        const x = -95 + (190 * n) / (ROWS - 1);
        const z = (CURVATURE / 2e3) * x * x * 1e3 + 0.05 * Math.sin(12.9898 * n);
        piece += `${x.toFixed(5)},${z.toFixed(4)}\n`;
      }
      if (!file.write(piece)) await once(file, "drain");
    }
    file.end();
    await once(file, "finish");
    return await work(path);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

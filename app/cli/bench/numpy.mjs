import { spawnSync } from "node:child_process";

export const python = "/usr/bin/python3";
const installer = "/usr/bin/apt-get";

/** One thread, whatever library NumPy was built with. */
const oneThread = { OMP_NUM_THREADS: "1", OPENBLAS_NUM_THREADS: "1", MKL_NUM_THREADS: "1" };

function hasNumpy() {
  return spawnSync(python, ["-c", "import numpy"]).status === 0;
}

/**
 * Makes sure that Debian's NumPy is there, as root by installing it.
 *
 * @returns {string | null} why it is not, in one sentence
 */
export function needNumpy() {
  if (hasNumpy()) return null;
  if (process.getuid?.() !== 0)
    return "Without NumPy there is nothing to compare with: install Debian's python3-numpy as root, then run this again.";
  const options = { stdio: "ignore", env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" } };
  const wait = ["-o", "DPkg::Lock::Timeout=300"];
  // An update that fails is no reason to stop: the lists at hand may do.
  spawnSync(installer, [...wait, "update"], options);
  spawnSync(installer, [...wait, "install", "-y", "--no-install-recommends", "python3-numpy"], options);
  return hasNumpy() ? null : "Debian's python3-numpy could not be installed, so there is nothing to compare with.";
}

/**
 * The same laminate in NumPy: processor times by layout and chunk size, and what all draws give if a summary is asked for.
 *
 * @param {object} given
 * @returns {{ found: { layout: string, chunk: number, nsPerDraw: number, nsArithmetic: number }[], version: string,
 *   seconds?: number, mean?: number, high?: number, errorOfMean?: number, errorOfHigh?: number }}
 */
export function numpyLaminate(given) {
  const program = `${process.cwd()}/app/cli/bench/laminate.py`;
  const run = spawnSync(python, [program], {
    input: JSON.stringify(given),
    encoding: "utf8",
    env: { ...process.env, ...oneThread },
  });
  if (run.status !== 0) throw new Error(`NumPy's part failed: ${run.stderr}`);
  return JSON.parse(run.stdout);
}

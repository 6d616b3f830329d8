import { spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";
import { needNumpy, python } from "./numpy.mjs";
import { CURVATURE, ROWS, withScanFile } from "./scan-file.mjs";

const ROUNDS = 3;
/** A file of this folder. The bench runs built, as deep below the root as its source is. */
const beside = (name) => fileURLToPath(new URL(`../../../app/cli/bench/${name}`, import.meta.url));

function answer(program, args) {
  const run = spawnSync(program, args, { encoding: "utf8" });
  if (run.status !== 0) throw new Error(`A part of the bench failed: ${run.stderr}`);
  return JSON.parse(run.stdout);
}

const own = (what, path) => answer(process.execPath, ["--import", "tsx", beside("scan-read.mjs"), what, path]);

/** A scan of a million rows parsed, checked and fitted, beside PapaParse tokenising it and Python doing the same. */
export async function scans() {
  const missing = needNumpy();
  // In turn, so that a busy moment of the machine does not fall on one side alone.
  const rounds = await withScanFile((path) =>
    Array.from({ length: ROUNDS }, () => ({
      read: own("read", path),
      once: own("once", path),
      papa: own("tokenise", path),
      numpy: missing ? null : answer(python, [beside("scan_file.py"), path]),
    })),
  );
  const least = (pick) => Math.min(...rounds.map(pick));
  const seconds = least(({ read }) => read.seconds);
  const papa = least((round) => round.papa.seconds);
  const s = (value) => `${value.toFixed(2)} s`;
  console.log(
    `Scan of ${ROWS} rows from disk, parsed, checked and fitted: ${s(seconds)} of processor time, of that parsed ${s(least(({ read }) => read.parsing))}`,
  );
  console.log(
    `    PapaParse alone tokenises its text in ${s(papa)}: ratio ${(seconds / papa).toFixed(2)} (wanted 1.5 or less)`,
  );
  if (missing) console.log(`    ${missing}`);
  else {
    const numpy = least((round) => round.numpy.seconds);
    console.log(
      `    Python's csv and NumPy's polyfit take ${s(numpy)}: ratio ${(seconds / numpy).toFixed(2)} (wanted 1 or less)`,
    );
  }
  const [{ read, once, numpy }] = rounds;
  const off = (value) => Math.abs(value / CURVATURE - 1).toExponential(1);
  console.log(
    `    memory ${Math.max(...rounds.map((round) => round.once.megabytes)).toFixed(0)} MB in a process that reads it once (wanted under 300 MB), cold ${s(once.seconds)}\n    curvature from ${read.fitted} points, spikes left out, off by ${off(read.curvature)}${numpy ? `, NumPy's from the same stretch by ${off(numpy.curvature)}` : ""}`,
  );
}

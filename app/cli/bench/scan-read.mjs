/**
 * A process of its own for one side of the bench of scan files, so that neither memory nor warm code is shared.
 * Arguments: 'read', 'once' or 'tokenise', path. Prints JSON: shortest processor time of three runs (or that of one, whose memory
 * is that of reading one file), and what it came to.
 */
import { closeSync, openSync, readFileSync, readSync } from "node:fs";
import Papa from "papaparse";
import { fitScan } from "../../engine/profile/fit-scan.ts";
import { checkOnWafer } from "../../lib/profile-on-wafer.ts";
import { scanReader } from "../../lib/scan-reading/scan-reader.ts";
import { shortest } from "./timing.mjs";

const RUNS = 3;
const PIECE = 64 * 1024;
const WAFER = { diameter: 0.2, edgeExclusion: 5e-3 };
const [what = "", path = ""] = process.argv.slice(2);

/** From the bytes on the disk to columns of numbers. */
function parsed() {
  const reader = scanReader("scan.csv");
  const file = openSync(path, "r");
  const piece = new Uint8Array(PIECE);
  for (let length = readSync(file, piece); length > 0; length = readSync(file, piece))
    reader.push(piece.subarray(0, length));
  closeSync(file);
  const read = reader.end();
  if (read.outcome !== "read" || read.content.kind !== "profiles") throw new Error("the bench's file was not read");
  return read.content;
}

function readAndFitted() {
  const { profiles, rows } = parsed();
  const [profile] = profiles;
  checkOnWafer({ points: profile, reading: profile }, "scan.csv", WAFER);
  const { curvature, used } = fitScan(profile, { edgeExclusion: WAFER.edgeExclusion, robust: true });
  return { curvature, rows, fitted: used };
}

function read(runs) {
  let found = null;
  const seconds = shortest(runs, () => (found = readAndFitted()));
  return { seconds, ...found };
}

/** PapaParse alone, on text that is in memory already: the faster of the whole text at once and by pieces. */
function tokenise() {
  const text = readFileSync(path, "utf8");
  const config = { delimiter: ",", newline: "\n" };
  let rows = 0;
  const whole = shortest(RUNS, () => {
    rows = Papa.parse(text, config).data.length;
  });
  const pieces = shortest(RUNS, () => {
    Papa.parse(text, { ...config, chunkSize: PIECE, chunk: ({ data }) => (rows += data.length) });
  });
  return { seconds: Math.min(whole, pieces), rows };
}

const sides = {
  read: () => ({ ...read(RUNS), parsing: shortest(RUNS, parsed) }),
  once: () => read(1),
  tokenise,
};
const side = sides[what];
if (!side) throw new Error(`there is no '${what}'`);
console.log(JSON.stringify({ ...side(), megabytes: process.resourceUsage().maxRSS / 1024 }));

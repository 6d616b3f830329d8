import type { ColumnRole, FileKind, ReadUnit } from "./reading.ts";
import { headWithoutUnit, type Dimension } from "./units.ts";

/** What a role measures; none for names and counts. */
const DIMENSIONS: Partial<Record<ColumnRole, Dimension>> = {
  position: "length",
  radius: "length",
  height: "length",
  y: "length",
  angle: "angle",
  thickness: "length",
  bow: "length",
  warp: "length",
  sori: "length",
  "thickness variation": "length",
  stress: "stress",
  modulus: "stress",
  "film thickness": "length",
  "substrate thickness": "length",
  "radius before": "length",
  "radius after": "length",
};

export const dimensionOfRole = (role: ColumnRole | null): Dimension | null =>
  role === null ? null : (DIMENSIONS[role] ?? null);

/** Units to choose from for a role whose file names none. */
export const UNIT_CHOICES: Record<Dimension, readonly ReadUnit[]> = {
  length: ["mm", "µm", "nm", "Å", "inch", "mil", "m"],
  stress: ["MPa", "GPa", "Pa", "1E9 dyn/cm²", "1E10 dyn/cm²", "dyn/cm²", "1E11 Pa"],
  angle: ["°", "rad"],
};

/** Heads by what they name, in the order in which they are tried; matched against lower-case words parted by single blanks. */
const HEADS: readonly (readonly [ColumnRole, RegExp])[] = [
  ["slope", /\bslope\b|\bgradient\b|\bderivative\b|^d ?z ?d ?x\b|^tilt\b/],
  [
    "levelled height",
    /\blevell?ed\b|\bdetrended\b|\bflattened\b|\bfiltered\b|\btilt (?:removed|corrected)\b|\bplane fit\b/,
  ],
  ["radius before", /^(?:r ?1|r ?pre|r ?0|pre r|pre radius|radius (?:1|pre|before|initial)|r before|initial radius)\b/],
  ["radius after", /^(?:r ?2|r ?post|post r|post radius|radius (?:2|post|after|final)|r after|final radius)\b/],
  ["film thickness", /^(?:film (?:thickness|thk)|layer thickness|t ?f|h ?f)\b/],
  ["substrate thickness", /^(?:substrate (?:thickness|thk)|silicon thickness|t ?s|h ?s)\b/],
  ["modulus", /\bmodulus\b/],
  ["stress", /\bstress\b|^sigma\b|^σ/],
  ["thickness variation", /^(?:ttv|gbir|total thickness variation)\b/],
  ["bow", /^bow\b/],
  ["warp", /^warp(?:age)?\b/],
  ["sori", /^sori\b/],
  ["thickness", /^(?:thk|thick|thickness|total thickness|wafer thickness)\b/],
  ["lot", /^(?:lot|batch)\b/],
  ["slot", /^slot\b/],
  ["wafer", /^(?:wafer|wid|scribe)\b/],
  [
    "height",
    /^(?:z|h)\b|\bheight|\btopograph|\bprofile\b|\bdeflection\b|\belevation\b|\bsurface\b|^(?:level|raw|pre|post|before|after)\b/,
  ],
  ["position", /^(?:x|pos)\b|\bposition\b|\blateral\b|\bdistance\b|^scan\b/],
  ["radius", /^(?:r|radius|radial)\b/],
  ["y", /^y\b/],
  ["angle", /^(?:theta|angle|azimuth|phi)\b|^[θφ]$/],
  ["date", /^date\b|\btime ?stamp\b|^measured\b/],
  ["time", /^(?:t|time|elapsed|seconds?)\b/],
  ["index", /^(?:#|no|nr|n|i|pt|point|index|idx|row|sample|site|data point|line)\b|^#/],
];

/** A head in lower case, words parted by single blanks, a number at the end of a word parted from it. */
export function headWords(head: string): string {
  return headWithoutUnit(head)
    .replace(/([\p{Ll}])(\p{Lu})/gu, "$1 $2")
    .toLowerCase()
    .replace(/([\p{L}])(\d)/gu, "$1 $2")
    .replace(/[^\p{L}\p{N}#]+/gu, " ")
    .trim();
}

/** What the head of a column names; null when it says nothing known. */
export function roleOfHead(head: string): ColumnRole | null {
  const words = headWords(head);
  return HEADS.find(([, pattern]) => pattern.test(words))?.[0] ?? null;
}

/** What a file is by what its heads name. */
export function kindOfRoles(roles: readonly (ColumnRole | null)[]): FileKind {
  const has = (...wanted: ColumnRole[]) => wanted.some((role) => roles.includes(role));
  if (has("stress") && has("radius before", "radius after", "film thickness", "modulus", "wafer", "slot"))
    return "reduced stress";
  if (has("bow", "warp", "sori", "thickness variation") || (has("thickness") && has("slot", "lot"))) return "summary";
  if (has("thickness") && ((has("position") && has("y")) || (has("radius") && has("angle")))) return "thickness map";
  return "profiles";
}

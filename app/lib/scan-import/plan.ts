import { pairScans } from "#app/engine/profile/orient-scan.ts";
import { blankMessage } from "#app/lib/read-quantity.ts";
import type { BatchFile } from "./batch.ts";
import { kindOf, lineWords, linesOf, takenLines, waferWords } from "./place-words.ts";

/** Files that go in together, with what they will be. */
export interface PlannedItem {
  files: BatchFile[];
  label: string;
  /** what becomes of them, after the label */
  words: string;
}

export interface BatchPlan {
  items: PlannedItem[];
  /** files that stay, each with the sentence why */
  staying: { file: BatchFile; why: string }[];
}

/** What a batch brings in as it stands: pairs by wafer and line, files that wait for a partner, tables; and why each other file stays. */
export function batchPlan(files: readonly BatchFile[]): BatchPlan {
  const staying = files.flatMap((file) => {
    const why = whyNotReady(file);
    return why === null ? [] : [{ file, why }];
  });
  const ready = files.filter((file) => whyNotReady(file) === null);
  const singles = ready.filter((file) => kindOf(file) === "profiles" && linesOf(file).length === 1);
  const placed = (side: "before" | "after") =>
    singles
      .filter(({ of }) => of.side === side)
      .map((file) => ({ file, wafer: waferKey(file), azimuth: degreesOf(file) * (Math.PI / 180) }));
  const { pairs } = pairScans(placed("before"), placed("after"));
  const partner = new Map(pairs.map(({ pre, post }) => [pre.file.key, post.file]));
  const taken = new Set(pairs.map(({ post }) => post.file.key));
  const items = ready
    .filter(({ key }) => !taken.has(key))
    .map((file): PlannedItem => {
      const after = partner.get(file.key);
      return after ? pairItem(file, after) : soleItem(file);
    });
  return { items, staying };
}

const THICKNESSES = { filmThickness: "film thickness", siliconThickness: "silicon thickness" };

/** What the pairs of a batch need of its shared fields and do not find there, by field; null when nothing is missing. */
export function missingOfPairs(items: readonly PlannedItem[], shared: FormData): Record<string, string[]> | null {
  if (items.every(({ files }) => files.length < 2)) return null;
  const missing = Object.entries(THICKNESSES).flatMap(([field, words]) => {
    const typed = shared.get(field);
    const isTyped = typeof typed === "string" && typed.trim() !== "";
    return isTyped ? [] : [{ field, said: [blankMessage({ label: words })] }];
  });
  return missing.length === 0 ? null : Object.fromEntries(missing.map(({ field, said }) => [field, said]));
}

const pairItem = (before: BatchFile, after: BatchFile): PlannedItem => ({
  files: [before, after],
  label: lineWords(before.of),
  words: `${before.file.name} before, ${after.file.name} after the film`,
});

function soleItem(file: BatchFile): PlannedItem {
  const kind = kindOf(file);
  const { name } = file.file;
  if (kind !== "profiles") {
    const of = waferWords(kind === "summary" ? { ...file.of, wafer: "", slot: "" } : file.of);
    return { files: [file], label: name, words: `a ${kind}${of === "" ? "" : `; where a row names none, ${of}`}` };
  }
  const lines = takenLines(file) ?? [];
  const label = lines.length === 1 ? lineWords(file.of) : waferWords(file.of);
  const along = lines.length === 1 ? "" : ` along ${lines.map(({ degrees }) => `${degrees}°`).join(", ")}`;
  return {
    files: [file],
    label,
    words: `${name} ${file.of.side} the film${along}; its partner is not in this batch`,
  };
}

/** Why a file cannot go in yet; null when it can. */
function whyNotReady(file: BatchFile): string | null {
  const { told, done, of } = file;
  if (done !== null || told === null) return "is being read.";
  if (told.outcome === "refused") return "cannot be read.";
  if (told.outcome === "question") return "has an open question.";
  if (kindOf(file) !== "profiles") return null;
  if (of.wafer.trim() === "" && (of.lot.trim() === "" || of.slot.trim() === "")) return "has no wafer yet.";
  const lines = takenLines(file);
  if (lines === null) return "has an azimuth that is no angle of 0 to 360°.";
  if (lines.length === 0) return "holds several profiles: type the azimuth of those that count.";
  if (of.side === "") return "is not said to be before or after the film.";
  return null;
}

const degreesOf = (file: BatchFile) => takenLines(file)?.[0]?.degrees ?? 0;

/** The wafer by its name in its lot; by its slot where it has no name. */
const waferKey = ({ of: { wafer, lot, slot } }: BatchFile) =>
  JSON.stringify([wafer, lot, wafer.trim() === "" ? slot : ""].map((text) => text.trim().toLowerCase()));

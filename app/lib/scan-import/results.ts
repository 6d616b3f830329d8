import { keptFilePath } from "#app/lib/kept-file.ts";
import { count } from "#app/lib/count-words.ts";
import type { BroughtInBefore, KeptFile, PlacedProfile } from "#app/schemas/scan-import.ts";

/** What came of a file, or of one profile of it, as a line of the list. */
export interface ImportResult {
  key: string;
  outcome: "scan" | "waits" | "already" | "measured";
  label: string;
  /** page of what came of it; null where there is none */
  path: string | null;
  /** after the label: 'waits for its partner' */
  words: string;
  files: string[];
  /** what an undo is asked with; null for what this import did not bring in */
  undo: { what: "scan" | "waiting" | "table"; id: string } | null;
}

/** The list with what came of one more file. A file that has waited is named with the scan that it has become part of. */
export function addedResults(
  known: readonly ImportResult[],
  { file, key }: { file: string; key: string },
  answer: KeptFile,
): ImportResult[] {
  if (answer.outcome !== "placed") return [...known, tableResult(file, key, answer)];
  let results = [...known];
  answer.placed.forEach((placed, n) => {
    const line = { key: `${key} ${n}`, label: placed.label, files: [file] };
    if (placed.outcome !== "scan") {
      results.push({ ...line, ...waitingOrKnown(placed) });
      return;
    }
    const waited = results.find(({ undo }) => undo?.what === "waiting" && undo.id === placed.partner);
    results = results.filter((each) => each !== waited);
    const undo = { what: "scan", id: placed.scan } as const;
    const files = [...(waited?.files ?? []), file];
    const words = waited ? "is a scan" : "is a scan with the file that has waited";
    results.push({ ...line, outcome: "scan", path: `/scans/${placed.scan}`, words, files, undo });
  });
  return results;
}

function waitingOrKnown(
  placed: Exclude<PlacedProfile, { outcome: "scan" }>,
): Pick<ImportResult, "outcome" | "path" | "words" | "undo"> {
  const waiting = `/scans/waiting/${placed.waferScan}`;
  if (placed.outcome === "waits")
    return {
      outcome: "waits",
      path: waiting,
      words: "waits for its partner",
      undo: { what: "waiting", id: placed.waferScan },
    };
  const path = placed.scan === null ? waiting : `/scans/${placed.scan}`;
  return { outcome: "already", path, words: importedBefore(placed.before), undo: null };
}

function tableResult(file: string, key: string, answer: Exclude<KeptFile, { outcome: "placed" }>): ImportResult {
  const line = { key, label: file, files: [] };
  if (answer.outcome === "known table")
    return { ...line, outcome: "already", path: null, words: importedBefore(answer.before), undo: null };
  const { kind, wafers, lots, reading } = answer;
  const of = wafers === 1 ? "one wafer" : `${count(wafers)} wafers`;
  const named =
    lots.length === 0 ? "" : `, ${lots.length === 1 ? "lot" : "lots"} ${lots.map(({ name }) => name).join(", ")}`;
  return {
    ...line,
    outcome: "measured",
    path: keptFilePath(answer),
    words: `is in, a ${kind} of ${of}${named}`,
    undo: { what: "table", id: reading },
  };
}

const importedBefore = ({ at, by }: BroughtInBefore) => `was imported on ${at.slice(0, 10)} by ${by}`;

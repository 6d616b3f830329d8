import type { KeptFile, PlacedProfile } from "#app/schemas/scan-import.ts";
import { count } from "./count-words.ts";

/** What came of a file that is in, in a sentence: 'One scan made, one waits for its partner.' */
export function keptFileSentence(kept: KeptFile): string {
  if (kept.outcome === "known table") return "It had been imported before.";
  if (kept.outcome === "measured")
    return `A ${kept.kind} of ${kept.wafers === 1 ? "one wafer" : `${count(kept.wafers)} wafers`} is in.`;
  const of = (outcome: PlacedProfile["outcome"]) => kept.placed.filter((each) => each.outcome === outcome).length;
  const [scans, waits, already] = [of("scan"), of("waits"), of("already")];
  const parts = [
    scans > 0 && `${count(scans)} ${scans === 1 ? "scan" : "scans"} made`,
    waits > 0 && (waits === 1 ? "one waits for its partner" : `${count(waits)} wait for their partners`),
    already > 0 && `${count(already)} had been imported before`,
  ].filter((part) => part !== false);
  const text = parts.join(", ");
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

/** Where to see what came of it: the first scan, else the file that waits, else the wafer or lot; null where there is no page. */
export function keptFilePath(kept: KeptFile): string | null {
  if (kept.outcome !== "placed") {
    if (kept.outcome === "known table") return null;
    const [lot] = kept.lots;
    if (kept.only !== null) return `/wafers/${kept.only}`;
    return lot ? `/lots/${lot.id}` : null;
  }
  const scan = kept.placed.flatMap((placed) => (placed.outcome === "waits" ? [] : (placed.scan ?? []))).at(0);
  if (scan !== undefined) return `/scans/${scan}`;
  const [waits] = kept.placed.flatMap((placed) => (placed.outcome === "scan" ? [] : placed.waferScan));
  return waits === undefined ? null : `/scans/waiting/${waits}`;
}

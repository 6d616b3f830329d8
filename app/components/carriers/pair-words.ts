import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import { knownShapeWord } from "#app/engine/vocabulary.ts";
import type { TriedPair } from "#app/lib/pair-trial.ts";

const micrometres = (value: number) => formatQuantity(value, "length", { unit: "µm", significant: 3, trim: true });

/** Below this nothing is said of a bow, m: the calculation leaves more out than that. */
const NOTHING = 1e-6;

/** Warp with its expanded uncertainty, k = 2. */
function warpOf({ warp, uncertainty }: TriedPair): string {
  return 2 * uncertainty < NOTHING
    ? micrometres(warp)
    : formatWithUncertainty(warp, 2 * uncertainty, "length", { unit: "µm" });
}

function lying(pair: TriedPair): string {
  const { lies, rollRadius, warp, uncertainty } = pair;
  if (lies === "rolls up" && rollRadius !== null) {
    const radius = formatQuantity(rollRadius, "length", { unit: "m", significant: 2 });
    return `rolls up, radius about ${radius}, and its edges lift ${formatQuantity(warp, "length", { significant: 2 })}`;
  }
  if (lies === "flat" && warp + 2 * uncertainty < NOTHING) return `lies flat within ${micrometres(NOTHING)}`;
  return `lies ${knownShapeWord(lies, warp, uncertainty)}, ${warpOf(pair)}`;
}

/** How the pair lies, in one sentence. */
export function pairAnswer(pair: TriedPair): string {
  const silicon = `${micrometres(pair.siliconLeft)} of blank silicon`;
  return `Bonded to ${silicon} with ${pair.material.name}, the pair ${lying(pair)}.`;
}

/** Why the pair's bow decides and the difference in expansion does not. */
export function whyPairBow({ perTenthPpm, wafer }: TriedPair): string {
  const match = "A match is judged by the computed bow of the pair, never by a window of ppm:";
  if (perTenthPpm === null)
    return `${match} this carrier expands as the wafer does, and the bow that is left comes from the bonding material.`;
  const size = formatQuantity(wafer.diameter, "length", { unit: "mm" });
  return `${match} here 0.1 ppm/K of the carrier’s expansion moves a ${size} pair by ${micrometres(perTenthPpm)}.`;
}

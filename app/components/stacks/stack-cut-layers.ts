import type { CutLayer } from "#app/components/drawings/cut-layer.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { DraftLayer, StackDraft } from "#app/lib/stack-draft.ts";
import { directionWords } from "#app/lib/film-cut.ts";
import { lengthWords, thicknessWords } from "#app/lib/stack-words.ts";

/** What a layer without a thickness is drawn as thick as, m. */
const NOT_TYPED = 1e-6;

/** Which layer of the cut is which: the films of the form by their index, and the silicon between them. */
export type CutPartOf = number | "silicon";

/** A stack as it is being typed, as layers of a cut, top to bottom, each with what it stands for. */
export function stackCutLayers(draft: StackDraft, selected: CutPartOf | null): { part: CutPartOf; layer: CutLayer }[] {
  const films = draft.layers.map((layer, index) => ({
    part: index,
    layer: filmLayer(layer, selected === index),
    on: layer.side,
  }));
  const silicon = { part: "silicon" as const, layer: siliconLayer(draft, selected === "silicon") };
  return [...films.filter(({ on }) => on === "front"), silicon, ...films.filter(({ on }) => on === "back")].map(
    ({ part, layer }) => ({ part, layer }),
  );
}

function filmLayer({ name, film, thickness, stress, cut }: DraftLayer, selected: boolean): CutLayer {
  return {
    role: "film",
    kind: film?.kind ?? "blank",
    thickness: thickness ?? NOT_TYPED,
    thicknessText: thickness === null ? "?" : lengthWords(thickness),
    stress: stress && thickness !== null ? stress.value : undefined,
    coverage: cut?.coverage,
    name: film ? shortName(name) : "Film not chosen",
    notes: [...(stress ? [stressWords(stress.value), ...sourceNotes(stress)] : []), ...lineNotes(cut)],
    assumed: stress?.source === "assumed",
    selected,
  };
}

/** A film's name without what stands in brackets after it: a label has little room. */
const shortName = (name: string) => name.replace(/ \(.*\)$/, "");

/** Film stress with its word: '+118 MPa tension'. */
export function stressWords(stress: number): string {
  if (stress === 0) return "no stress";
  const value = formatQuantity(stress, "stress", { unit: "MPa", sign: true });
  return `${value} ${stress > 0 ? "tension" : "compression"}`;
}

/** A label has little room: which way the lines run, in one short line. */
function lineNotes(cut: DraftLayer["cut"]): string[] {
  return cut?.lines ? [`lines ${directionWords(cut.lines.direction)}`] : [];
}

/** The cut adds 'assumed' by itself. */
function sourceNotes({ source, on }: NonNullable<DraftLayer["stress"]>): string[] {
  if (source === "assumed") return [];
  return [source === "measured here" && on ? `measured ${on}` : source];
}

function siliconLayer({ silicon, thickness }: StackDraft, selected: boolean): CutLayer {
  const plane = silicon?.orientation === "111" ? "111" : "001";
  const diameter = silicon && formatQuantity(silicon.diameter, "length", { unit: "mm" });
  return {
    role: "silicon",
    kind: "silicon",
    thickness: thickness ?? silicon?.thickness ?? 100e-6,
    thicknessText: thickness === null ? "?" : thicknessWords(thickness),
    name: silicon ? `Silicon (${plane}), ${diameter}` : "Silicon not chosen",
    notes: silicon ? [`from ${thicknessWords(silicon.thickness)}`] : [],
    selected,
  };
}

import { spreadLabels } from "./spread-labels.ts";
import { wrapText } from "./wrap-text.ts";

/** Columns of the cut, px. */
export const CUT = { width: 464, left: 96, right: 276, dimension: 78, label: 306, labelEnd: 458 } as const;

export const NAME_SIZE = 14;
export const NOTE_SIZE = 12.5;
const NAME_LINE = 18;
const NOTE_LINE = 16;
/** Least distance between the middles of two labels, px. */
const LABEL_PITCH = 56;

/**
 * Drawn height of a layer, px: 26 + k·log10(1 + t/0.5 µm), k = 50 for up to 5 layers and 30 for more. Thick layers are
 * compressed, thin ones stay selectable.
 * @param thickness m
 * @param layers how many layers the cut has
 */
export function layerHeight(thickness: number, layers: number): number {
  return 26 + (layers <= 5 ? 50 : 30) * Math.log10(1 + thickness / 0.5e-6);
}

export interface CutPlace {
  /** Upper edge and height of the band. */
  y: number;
  height: number;
  /** The label block: its middle, its height and the lines it is set in. */
  labelY: number;
  labelHeight: number;
  name: string[];
  notes: string[];
}

export interface CutLayout {
  places: CutPlace[];
  top: number;
  bottom: number;
  /** Lowest point of bands and labels. */
  foot: number;
}

/**
 * Places of all bands and labels. Labels keep the height of their band where they can; where they would touch they
 * spread symmetrically, at least 56 px apart, and the whole cut moves down when the first would leave the drawing.
 * @param layers top to bottom as drawn
 * @param headRoom px above the first band for the words at that end
 */
export function cutLayout(
  layers: readonly { thickness: number; name: string; notes: readonly string[] }[],
  headRoom: number,
): CutLayout {
  const room = CUT.labelEnd - CUT.label;
  let y = headRoom;
  const bands = layers.map((layer) => {
    const height = Math.round(layerHeight(layer.thickness, layers.length));
    const name = wrapText(layer.name, room, NAME_SIZE, 3, true);
    const notes = layer.notes.flatMap((note) => wrapText(note, room, NOTE_SIZE, 3));
    const labelHeight = Math.max(LABEL_PITCH, name.length * NAME_LINE + notes.length * NOTE_LINE + 10);
    const band = { y, height, labelHeight, name, notes };
    y += height;
    return band;
  });
  const centres = spreadLabels(
    bands.map((band) => band.y + band.height / 2),
    bands.map((band) => band.labelHeight),
  );
  const first = (centres[0] ?? 0) - (bands[0]?.labelHeight ?? 0) / 2;
  const down = Math.max(0, 4 - first);
  const places = bands.map((band, index) => ({ ...band, y: band.y + down, labelY: (centres[index] ?? 0) + down }));
  const last = places.at(-1);
  return {
    places,
    top: headRoom + down,
    bottom: y + down,
    foot: Math.max(y + down, last ? last.labelY + last.labelHeight / 2 : 0),
  };
}

/** Baselines of a label's lines, from its middle. */
export function labelBaselines(place: CutPlace): { name: number[]; notes: number[] } {
  const block = place.name.length * NAME_LINE + place.notes.length * NOTE_LINE;
  const top = place.labelY - block / 2;
  return {
    name: place.name.map((_, index) => top + NAME_LINE * index + 14),
    notes: place.notes.map((_, index) => top + NAME_LINE * place.name.length + NOTE_LINE * index + 12),
  };
}

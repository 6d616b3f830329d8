import type { Measured } from "#app/engine/measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { SIDE_NAMES } from "#app/engine/vocabulary.ts";
import type { ComparedGroup, ComparedRow } from "#app/schemas/comparison.ts";
import { comparedRow, type RowCell } from "../comparison/compared-row.ts";
import { filmCutWords } from "../film-cut.ts";
import { formatMeasured } from "../format-measured.ts";
import { thicknessWords } from "../stack-words.ts";
import type { ComparedStack } from "./figures.ts";
import { filmSlots, type FilmSlot } from "./film-slots.ts";

/** Digits to which two inputs count as the same: what was typed in another unit must not differ. */
const digits = (value: number | null) => value?.toPrecision(9) ?? null;
const sameMeasured = ({ value, tolerance, source }: Measured) => [digits(value), digits(tolerance), source];

const NOT_THERE: RowCell = { text: "none", same: null };

/** The inputs of stacks as rows: wafer, each film, and the order of films. */
export function inputGroups(stacks: readonly ComparedStack[]): ComparedGroup[] {
  const slots = filmSlots(stacks);
  return [
    { key: "wafer", title: "Wafer", rows: waferRows(stacks) },
    ...slots.map((slot) => ({ key: slot.key, title: slotTitle(slot, slots), rows: filmRows(slot, stacks) })),
    { key: "order", title: "Films from the silicon outwards", rows: orderRows(stacks) },
  ].filter(({ rows }) => rows.length > 0);
}

function waferRows(stacks: readonly ComparedStack[]): ComparedRow[] {
  return [
    comparedRow("diameter", "Diameter", stacks, ({ silicon: { diameter } }) => ({
      text: formatQuantity(diameter, "length", { unit: "mm" }),
    })),
    comparedRow("silicon", "Silicon", stacks, ({ silicon }) => ({ text: silicon.name })),
    comparedRow("thickness", "Remaining thickness", stacks, ({ siliconThickness }) => ({
      text: formatMeasured(siliconThickness, "length", { unit: "µm" }),
      note: siliconThickness.tolerance === null ? "no tolerance" : siliconThickness.source,
      same: sameMeasured(siliconThickness),
    })),
  ];
}

/** A film by its name and its place. */
export function slotTitle({ name, side, occurrence, key }: FilmSlot, slots: readonly FilmSlot[]): string {
  const [film] = key.split(/ \d+$/);
  const several = slots.filter((slot) => slot.key.startsWith(`${film} `)).length > 1;
  return `${name}, ${SIDE_NAMES[side]}${several ? `, number ${occurrence} from the silicon` : ""}`;
}

function filmRows({ places, key }: FilmSlot, stacks: readonly ComparedStack[]): ComparedRow[] {
  const row = (
    part: string,
    label: string,
    cellOf: (layer: ComparedStack["layers"][number], stack: ComparedStack, place: number) => RowCell,
  ) =>
    comparedRow(`${key} ${part}`, label, stacks, (stack, column) => {
      const place = places[column] ?? null;
      const layer = place === null ? undefined : stack.layers[place];
      return layer && place !== null ? cellOf(layer, stack, place) : NOT_THERE;
    });
  return [
    row("thickness", "Thickness", ({ thickness }) => ({
      text: formatMeasured(thickness, "length", { unit: thickness.value < 1e-6 ? "nm" : "µm" }),
      note: thickness.tolerance === null ? "no tolerance" : thickness.source,
      same: sameMeasured(thickness),
    })),
    row("stress", "Stress at 25\u00A0°C", ({ stress }) => ({
      text: formatMeasured(stress, "stress", { unit: "MPa", sign: true }),
      note: stress.tolerance === null ? `${stress.source}, no tolerance` : stress.source,
      same: sameMeasured(stress),
    })),
    row("cover", "Covers", ({ coverage, lines }) => ({
      text: filmCutWords({ coverage, lines }) ?? "all of it",
      same: [digits(coverage), lines ? [digits(lines.width), digits(lines.direction)] : null],
    })),
    row("force", "Force per width", (_, { figures }, place) => (figures ? forceCell(figures.pulls, place) : UNKNOWN)),
  ];
}

export const UNKNOWN: RowCell = { text: "cannot be estimated" };

/** Force of a film with its share of all pulls of the stack, whichever way they pull. */
function forceCell(pulls: readonly number[], place: number): RowCell {
  const force = pulls[place] ?? 0;
  const all = pulls.reduce((sum, pull) => sum + Math.abs(pull), 0);
  const share = all === 0 ? 0 : Math.abs(force) / all;
  return {
    text: formatQuantity(force, "forcePerLength", { unit: "N/m", significant: 3, trim: true, sign: true }),
    note: `${formatQuantity(share, "fraction", { unit: "%", decimals: 0 })} of all film forces`,
  };
}

function orderRows(stacks: readonly ComparedStack[]): ComparedRow[] {
  const row = (side: "front" | "back", label: string) =>
    comparedRow(side, label, stacks, ({ layers }) => {
      const films = layers.filter((layer) => layer.side === side);
      return {
        text: films.map(({ filmName }) => filmName.replace(/ \(.*\)$/, "")).join("; ") || "none",
        same: films.map(({ filmId }) => filmId),
      };
    });
  return [row("front", "Device side"), row("back", "Back side")].filter(({ cells }) =>
    cells.some(({ text }) => text !== "none"),
  );
}

/** A remaining thickness as the label of a row. */
export const atThickness = (thickness: number) => `Warp at ${thicknessWords(thickness)}`;

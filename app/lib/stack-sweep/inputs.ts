import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { withThickness, type StackFilm, type StackInput } from "#app/engine/stack/model.ts";
import { RULES } from "#app/schemas/ranges.ts";
import type { ComparedInputs } from "#app/schemas/stack-comparison.ts";
import type { QuantityRule } from "../read-quantity.ts";
import { filmSlots } from "../stack-comparison/film-slots.ts";
import { slotTitle } from "../stack-comparison/rows.ts";

/** An input of a stack that can be swept. */
export interface SweepInput {
  /** what it is called in the address; of a film by which one it is, so that another film in its place is not taken for it */
  key: string;
  /** as a choice: 'Plated copper A, device side: thickness' */
  label: string;
  /** value of the stack, SI */
  value: number;
  rule: QuantityRule;
  /** unit of its axis */
  unit: string;
  /** a range that is usual for it, SI */
  usual: { from: number; to: number };
  /** whether a wide range is spread evenly over powers of ten */
  byPowers: boolean;
  put: (stack: StackInput, value: number) => StackInput;
}

/** Thin end of silicon, and the hot end of a temperature, unless others are asked for. */
const THIN_END = 20e-6;
const HOT_END = 533.15;
/** Least half of the usual range of a stress, Pa. */
const STRESS_SPAN = 100e6;

/** Everything of a stack that can be swept, wafer first, films from top to bottom. @param temperature K */
export function sweepInputs(stack: ComparedInputs, estimated: StackInput, temperature: number): SweepInput[] {
  const slots = filmSlots([stack]);
  return [
    ...waferInputs(stack, estimated, temperature),
    ...slots.flatMap((slot) => {
      const place = slot.places[0] ?? -1;
      const film = estimated.films[place];
      return film ? filmInputs(slot.key, slotTitle(slot, slots), film, place) : [];
    }),
  ];
}

function waferInputs({ silicon }: ComparedInputs, { wafer }: StackInput, temperature: number): SweepInput[] {
  return [
    {
      key: "silicon",
      label: "Silicon thickness",
      value: wafer.thickness,
      rule: RULES.siliconThickness,
      unit: "µm",
      usual: { from: Math.min(THIN_END, wafer.thickness / 2), to: Math.max(silicon.nominalThickness, wafer.thickness) },
      byPowers: true,
      put: withThickness,
    },
    {
      key: "temperature",
      label: "Temperature",
      value: temperature,
      rule: RULES.temperature,
      unit: "°C",
      usual: { from: ROOM_TEMPERATURE, to: HOT_END },
      byPowers: false,
      put: (stack, value) => ({ ...stack, temperature: value }),
    },
    {
      key: "diameter",
      label: "Wafer diameter",
      value: wafer.diameter,
      rule: RULES.diameter,
      unit: "mm",
      usual: { from: Math.min(0.15, wafer.diameter), to: Math.max(0.3, wafer.diameter) },
      byPowers: false,
      put: (stack, value) => ({ ...stack, wafer: { ...stack.wafer, diameter: value } }),
    },
  ];
}

type FilmPart = "thickness" | "stress" | "youngsModulus" | "expansion" | "coverage";

function filmInputs(slot: string, title: string, film: StackFilm, place: number): SweepInput[] {
  const part = (
    name: FilmPart,
    words: string,
    value: number,
    about: Pick<SweepInput, "rule" | "unit" | "usual" | "byPowers">,
  ): SweepInput => ({
    key: `${slot} ${name}`,
    label: `${title}: ${words}`,
    value,
    ...about,
    put: (stack, to) => ({
      ...stack,
      films: stack.films.map((one, n) => (n === place ? { ...one, [name]: to } : one)),
    }),
  });
  const { thickness, stress, youngsModulus, expansion, coverage = 1 } = film;
  const around = (value: number, share = 0.5) => ({ from: value * (1 - share), to: value * (1 + share) });
  const span = Math.max(Math.abs(stress), STRESS_SPAN);
  return [
    part("thickness", "thickness", thickness, {
      rule: RULES.filmThickness,
      unit: thickness < 1e-6 ? "nm" : "µm",
      usual: { from: thickness / 4, to: Math.min(thickness * 2, RULES.filmThickness.range.most) },
      byPowers: true,
    }),
    part("stress", "stress at its reference", stress, {
      rule: RULES.stress,
      unit: "MPa",
      usual: { from: stress - span, to: stress + span },
      byPowers: false,
    }),
    part("youngsModulus", "Young’s modulus", youngsModulus, {
      rule: RULES.modulus,
      unit: "GPa",
      usual: around(youngsModulus),
      byPowers: true,
    }),
    ...(expansion === undefined
      ? []
      : [
          part("expansion", "expansion", expansion, {
            rule: RULES.expansion,
            unit: "ppm/K",
            usual: expansion === 0 ? { from: 0, to: 20e-6 } : around(expansion),
            byPowers: false,
          }),
        ]),
    part("coverage", "area coverage", coverage, {
      rule: RULES.coverage,
      unit: "%",
      usual: { from: 0.1, to: 1 },
      byPowers: false,
    }),
  ];
}

import type { Resistance } from "#app/engine/flow/handling-inputs.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { quantityText } from "#app/lib/form-values.ts";

/** What a bonding material may be exposed to, in the order of its form; those with a column for the words of its data sheet. */
export const RESISTANCES = [
  { name: "vacuum", label: "Vacuum", says: "vacuum" },
  { name: "plasma", label: "Plasma", says: null },
  { name: "solvent", label: "Solvent", says: "solvent" },
  { name: "acid", label: "Acid", says: "acid" },
  { name: "base", label: "Base", says: "base" },
  { name: "ultraviolet", label: "Ultraviolet light", says: null },
] as const;

export type ResistanceName = (typeof RESISTANCES)[number]["name"];

/** What a record stands, as the text of its form. */
export function resistanceTexts(stands: Record<ResistanceName, Resistance | null>) {
  const text = (name: ResistanceName) => ({
    word: stands[name]?.word ?? "",
    longest: quantityText(stands[name]?.longest, "time", "min"),
  });
  return {
    vacuum: text("vacuum"),
    plasma: text("plasma"),
    solvent: text("solvent"),
    acid: text("acid"),
    base: text("base"),
    ultraviolet: text("ultraviolet"),
  };
}

/** 'resists for 30 min', 'attacked after 10 min', 'not given'. */
export function resistanceText(resistance: Resistance | null): string {
  if (resistance === null) return "not given";
  const { word, longest } = resistance;
  if (word === "unknown") return "not known";
  if (!longest) return word;
  const time = formatQuantity(longest, "time", { unit: longest < 3600 ? "min" : "h", trim: true, significant: 3 });
  return `${word} ${word === "attacked" ? "after" : "for"} ${time}`;
}

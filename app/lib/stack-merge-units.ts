import { FILM_PARTS, same, STACK_PARTS, type Part, type StackNames } from "./stack-differences.ts";
import type { LayerText, StackText } from "./stack-text.ts";

/** What is decided as one: its parts make sense only together. */
export interface Unit<Of> {
  field: string;
  label: string;
  parts: readonly Part<Of>[];
  /** the fields of a state that it is made of */
  take: (from: Of) => Partial<Of>;
}

/** Parts of a measured quantity in words beside its value. */
const PREFIX: Record<string, string> = { tolerance: "± ", on: "on " };

function unitOf<Of>(parts: readonly Part<Of>[], field: string, label: string, keys: readonly (keyof Of)[]): Unit<Of> {
  return {
    field,
    label,
    parts: parts.filter(
      (part) => part.field === field || part.field.startsWith(`${field}.`) || keys.some((key) => key === part.field),
    ),
    take: (from) => Object.fromEntries(keys.map((key) => [key, from[key]])) as Partial<Of>,
  };
}

const head = (field: keyof StackText & string, label: string) => unitOf(STACK_PARTS, field, label, [field]);
const film = (field: keyof LayerText & string, label: string, keys: (keyof LayerText)[] = [field]) =>
  unitOf(FILM_PARTS, field, label, keys);

export const HEAD_UNITS: readonly Unit<StackText>[] = [
  head("name", "Name"),
  head("note", "Note"),
  head("silicon", "Silicon"),
  head("siliconThickness", "Remaining silicon"),
];

export const FILM_UNITS: readonly Unit<LayerText>[] = [
  film("film", "Choice"),
  film("thickness", "Thickness"),
  film("stress", "Stress for this stack"),
  film("cut", "Cut", ["cut", "coverage", "lineWidth", "lineDirection"]),
];

/** The parts in which two states differ. */
export const differing = <Of>({ parts }: Unit<Of>, one: Of, other: Of): Part<Of>[] =>
  parts.filter(({ of, rule }) => !same(of(one), of(other), rule));

/** What a state says of a unit: its parts that differ among the states that are held against each other, all of them where none does. */
export function wordsOf<Of>(unit: Unit<Of>, among: readonly Of[], names: StackNames): (state: Of) => string {
  const [first, ...others] = among;
  const parts = unit.parts.filter(
    ({ of, rule }) => first !== undefined && others.some((other) => !same(of(first), of(other), rule)),
  );
  return (state) => {
    const said = parts.flatMap(({ field, of, words }) => {
      const text = of(state);
      if (text === "") return [];
      return [`${PREFIX[field.split(".").at(-1) ?? ""] ?? ""}${words ? words(text, names) : text}`];
    });
    return said.join(", ") || "blank";
  };
}

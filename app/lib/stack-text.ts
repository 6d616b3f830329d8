import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import { filmCutText, WHOLE, type FilmCutText } from "./film-cut.ts";
import { measuredText } from "./form-values.ts";
import { turnFront } from "./stack-order.ts";

/** A film of a stack as the text of its form fields. */
export type LayerText = {
  side: Side;
  film: string;
  thickness: MeasuredText;
  /** this stack's own; blank keeps the film's */
  stress: MeasuredText;
} & FilmCutText;

/** A stack as the text of its form; films as the cut shows them, top to bottom. */
export type StackText = {
  program: string;
  name: string;
  note: string;
  silicon: string;
  siliconThickness: MeasuredText;
  layers: LayerText[];
};

/** A stored stack, films from the silicon outwards. */
interface StoredStack {
  program: { id: string };
  name: string;
  note: string;
  silicon: { id: string };
  siliconThickness: Measured;
  layers: readonly {
    side: Side;
    filmId: string;
    thickness: Measured;
    ownStress: Measured | null;
    coverage: number;
    lines: FilmLines | null;
  }[];
}

/** A stored stack as its form shows it. */
export function textOfStack(stack: StoredStack): StackText {
  return {
    program: stack.program.id,
    name: stack.name,
    note: stack.note,
    silicon: stack.silicon.id,
    siliconThickness: measuredText(stack.siliconThickness, "length", { unit: "µm" }),
    layers: turnFront(stack.layers).map((layer) => ({
      side: layer.side,
      film: layer.filmId,
      thickness: measuredText(layer.thickness, "length"),
      stress: measuredText(layer.ownStress, "stress", { unit: "MPa" }),
      ...filmCutText(layer),
    })),
  };
}

/** A stack of which nothing is known but perhaps its program. */
export function newStackText(program: string): StackText {
  return { program, name: "", note: "", silicon: "", siliconThickness: {}, layers: [] };
}

/** A film that has just been added: it covers the wafer until somebody says otherwise. */
export function newLayer(side: Side): LayerText {
  return { side, film: "", thickness: {}, stress: {}, ...WHOLE };
}

/** A form's payload as text, whatever it holds: what is missing is blank. */
export function stackText(payload: unknown): StackText {
  const layers = at(payload, "layers");
  return {
    program: textAt(payload, "program"),
    name: textAt(payload, "name"),
    note: textAt(payload, "note").replaceAll("\r\n", "\n"),
    silicon: textAt(payload, "silicon"),
    siliconThickness: measuredAt(payload, "siliconThickness"),
    layers: Array.isArray(layers)
      ? layers.map((layer: unknown) => ({
          side: textAt(layer, "side") === "back" ? "back" : "front",
          film: textAt(layer, "film"),
          thickness: measuredAt(layer, "thickness"),
          stress: measuredAt(layer, "stress"),
          ...cutAt(layer),
        }))
      : [],
  };
}

/** Whether two forms say the same. */
export function saysTheSame(one: unknown, other: unknown): boolean {
  return JSON.stringify(stackText(one)) === JSON.stringify(stackText(other));
}

function at(value: unknown, key: string): unknown {
  return typeof value === "object" && value !== null ? (value as Record<string, unknown>)[key] : undefined;
}

function textAt(value: unknown, key: string): string {
  const found = at(value, key);
  return typeof found === "string" ? found : "";
}

/** Fields that the cut does not ask for go from the page once it is chosen: they say nothing any more. */
function cutAt(layer: unknown): FilmCutText {
  const cut = textAt(layer, "cut");
  const asked = (name: string, by: boolean) => (by ? textAt(layer, name) : "");
  return {
    cut,
    coverage: asked("coverage", cut !== "whole"),
    lineWidth: asked("lineWidth", cut === "lines"),
    lineDirection: asked("lineDirection", cut === "lines"),
  };
}

function measuredAt(value: unknown, key: string) {
  const measured = at(value, key);
  return {
    value: textAt(measured, "value"),
    tolerance: textAt(measured, "tolerance"),
    source: textAt(measured, "source"),
    note: textAt(measured, "note"),
    on: textAt(measured, "on"),
  };
}

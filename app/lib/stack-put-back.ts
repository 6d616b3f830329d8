import type { LayerText, StackText } from "./stack-text.ts";

/** The one change that turns a form's text into another. */
export type FormChange = {
  /** name of the first field that it changes, to be looked at */
  field: string;
} & (
  | {
      kind: "update";
      /** of the field, or of the part of the form that it is; undefined for all of it */
      name: string | undefined;
      value: unknown;
    }
  | { kind: "insert"; index: number; value: LayerText }
  | { kind: "remove"; index: number }
);

/**
 * The smallest single change that makes `from` into `to`; null where they are the same. What it leaves alone keeps its fields on the
 * page: twenty films are hundreds of them.
 */
export function putBack(from: StackText, to: StackText): FormChange | null {
  const [head, ...heads] = HEAD.filter((name) => !same(from[name], to[name]));
  const alike = same(from.layers, to.layers);
  if (head === undefined) return alike ? null : layersChange(from.layers, to.layers);
  if (alike && heads.length === 0) return updated(head, from[head], to[head]);
  return { kind: "update", name: undefined, value: to, field: head === "siliconThickness" ? `${head}.value` : head };
}

const HEAD = ["name", "note", "silicon", "siliconThickness"] as const;

const same = (one: unknown, other: unknown) => JSON.stringify(one) === JSON.stringify(other);

/** The smallest part that holds all of the difference; a value with its tolerance and source is made of parts, and so is a film. */
function updated(name: string, from: unknown, to: unknown): FormChange {
  if (!isParts(from) || !isParts(to)) return { kind: "update", name, value: to, field: name };
  const [part, ...more] = Object.keys(to).filter((key) => !same(from[key], to[key]));
  const within = part === undefined ? null : updated(`${name}.${part}`, from[part], to[part]);
  if (within && more.length === 0) return within;
  return { kind: "update", name, value: to, field: within?.field ?? name };
}

const isParts = (value: unknown): value is Record<string, unknown> =>
  typeof value === "object" && value !== null && !Array.isArray(value);

function layersChange(from: readonly LayerText[], to: readonly LayerText[]): FormChange {
  const more = to.length - from.length;
  const first = firstOther(from, to);
  // Of several alike in a row the uppermost is the one that comes or goes.
  const index = more === 0 ? first : topOfRun(more > 0 ? to : from, first);
  const layer = to[index];
  const field = `layers[${Math.max(0, Math.min(index, to.length - 1))}].film`;
  if (more === 1 && layer && same(from, to.toSpliced(index, 1))) return { kind: "insert", index, value: layer, field };
  if (more === -1 && same(from.toSpliced(index, 1), to)) return { kind: "remove", index, field };
  const alone = more === 0 && layer && same(from.slice(index + 1), to.slice(index + 1));
  if (alone) return updated(`layers[${index}]`, from[index], layer);
  return { kind: "update", name: "layers", value: to, field };
}

function firstOther(from: readonly LayerText[], to: readonly LayerText[]): number {
  const first = to.findIndex((layer, index) => !same(from[index], layer));
  return first === -1 ? to.length : first;
}

function topOfRun(layers: readonly LayerText[], index: number): number {
  let top = index;
  while (top > 0 && same(layers[top - 1], layers[top])) top -= 1;
  return top;
}

/** The film that a field's name belongs to; null for one of the stack itself. */
export function filmOf(field: string): number | null {
  const index = /^layers\[(\d+)\]/.exec(field)?.[1];
  return index === undefined ? null : Number(index);
}

import { readQuantity } from "../read-quantity.ts";
import type { AskedSide } from "./asked.ts";
import type { SweepInput } from "./inputs.ts";

/** A side of a sweep that can be drawn: an input over its range, SI. */
export interface SweepAxis {
  input: SweepInput;
  from: number;
  to: number;
  /** spread evenly over powers of ten */
  log: boolean;
}

export interface SideFaults {
  input?: string;
  from?: string;
  to?: string;
}

/** From this ratio of its ends on a range that may be is spread over powers of ten. */
const WIDE = 4;
/** Least width of a range, as a share of its ends: narrower ones could not be told apart on an axis. */
const NARROWEST = 1e-3;

/** Reads a side: the axis, or what is wrong with which field. */
export function readAxis(
  asked: AskedSide,
  inputs: readonly SweepInput[],
): { axis: SweepAxis | null; faults: SideFaults } {
  const input = inputs.find(({ key }) => key === asked.input);
  if (!input)
    return {
      axis: null,
      faults: { input: "The stack has no such input any more: the film was taken out. Choose another input." },
    };
  const faults: SideFaults = {};
  const end = (name: "from" | "to") => {
    if (asked[name] === "") return input.usual[name];
    const read = readQuantity(asked[name], input.rule);
    if (!read.ok) faults[name] = read.message;
    return read.ok ? read.value : NaN;
  };
  const [from, to] = [end("from"), end("to")];
  if (faults.from ?? faults.to) return { axis: null, faults };
  if (!(to - from > NARROWEST * Math.max(Math.abs(from), Math.abs(to))))
    return { axis: null, faults: { to: "The range is empty: type a value above where it begins." } };
  return { axis: { input, from, to, log: input.byPowers && from > 0 && to >= WIDE * from }, faults };
}

/** The value at a share, 0 to 1, of an axis; its ends exactly. */
export function valueAt({ from, to, log }: Pick<SweepAxis, "from" | "to" | "log">, share: number): number {
  if (share <= 0) return from;
  if (share >= 1) return to;
  return log ? from * (to / from) ** share : from + (to - from) * share;
}

/** The share of an axis at a value. */
export const shareAt = ({ from, to, log }: Pick<SweepAxis, "from" | "to" | "log">, value: number): number =>
  log ? Math.log(value / from) / Math.log(to / from) : (value - from) / (to - from);

export const isOn = (axis: SweepAxis, value: number): boolean => value >= axis.from && value <= axis.to;

/** Values spread evenly over an axis. */
export const valuesOn = (axis: SweepAxis, cells: number): number[] =>
  Array.from({ length: cells + 1 }, (_, n) => valueAt(axis, n / cells));

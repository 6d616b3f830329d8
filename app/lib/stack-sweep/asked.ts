/** One side of a sweep as it was typed. */
export interface AskedSide {
  /** key of the input; of the second side blank for a curve */
  input: string;
  /** range as typed, blank for the usual one */
  from: string;
  to: string;
}

/** What is swept, and what is asked of it: all of it in the address, so that every sweep can be linked. */
export interface SweepAsked {
  x: AskedSide;
  y: AskedSide;
  /** key of the answer */
  answer: string;
  /** key of the limit that is offered, 'none', or blank for the one that belongs to the answer */
  limit: string;
  /** a limit of one's own as typed; counts instead of the one that is offered */
  own: string;
  /** temperature as typed, blank for 25 °C */
  at: string;
}

export const NO_LIMIT = "none";
const LONGEST = 80;

/** Names of the fields in the address and in the form. */
export const SWEEP_FIELDS = {
  x: { input: "x", from: "x-from", to: "x-to" },
  y: { input: "y", from: "y-from", to: "y-to" },
} as const;

/** Reads a sweep from its address. */
export function readSweep(search: URLSearchParams): SweepAsked {
  const text = (name: string) => (search.get(name) ?? "").replaceAll("\0", "").trim().slice(0, LONGEST);
  const side = ({ input, from, to }: (typeof SWEEP_FIELDS)["x" | "y"]): AskedSide => ({
    input: text(input),
    from: text(from),
    to: text(to),
  });
  return {
    x: side(SWEEP_FIELDS.x),
    y: side(SWEEP_FIELDS.y),
    answer: text("answer"),
    limit: text("limit"),
    own: text("own"),
    at: text("at"),
  };
}

/** The search part of a sweep's address, without what is as it is by itself. */
export function sweepSearch({ x, y, answer, limit, own, at }: SweepAsked): string {
  const side = (names: (typeof SWEEP_FIELDS)["x" | "y"], { input, from, to }: AskedSide) => [
    [names.input, input],
    [names.from, from],
    [names.to, to],
  ];
  const given = [...side(SWEEP_FIELDS.x, x), ...side(SWEEP_FIELDS.y, y)];
  const all = [...given, ["answer", answer], ["limit", limit], ["own", own], ["at", at]];
  const said = new URLSearchParams(all.filter(([, value]) => value !== "")).toString();
  return said === "" ? "" : `?${said}`;
}

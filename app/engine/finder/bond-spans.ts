import type { FlowInput } from "../flow/model.ts";

/** A bond of a flow: the numbers of the steps that make it and take it off; `to` null when it stays on. */
export interface BondSpan {
  from: number;
  to: number | null;
}

/** The bonds of a flow in order. In a two-carrier transfer the first debond takes off the first carrier. */
export function bondSpans(flow: FlowInput): BondSpan[] {
  const debonds = flow.steps.flatMap(({ kind }, index) => (kind === "debond" ? [index + 1] : []));
  const bonds = flow.steps.flatMap(({ kind, bond }, index) => (kind === "bond" && bond ? [index + 1] : []));
  let after = 0;
  return bonds.map((from) => {
    const to = debonds.find((number) => number > from && number > after) ?? null;
    if (to !== null) after = to;
    return { from, to };
  });
}

import type { FlowInput, StepKind } from "../flow/model.ts";

/** A bond of a flow: the numbers of the steps that make it and take it off; `to` null when it stays on. */
export interface BondSpan {
  from: number;
  to: number | null;
}

/** The bonds of a flow in order, by the kinds of its steps. In a two-carrier transfer the first debond takes off the first carrier. */
export function spansOfKinds(kinds: readonly (StepKind | null)[]): BondSpan[] {
  const numbers = (wanted: StepKind) => kinds.flatMap((kind, index) => (kind === wanted ? [index + 1] : []));
  const debonds = numbers("debond");
  let after = 0;
  return numbers("bond").map((from) => {
    const to = debonds.find((number) => number > from && number > after) ?? null;
    if (to !== null) after = to;
    return { from, to };
  });
}

/** The bonds of a flow in order; a bond to nothing is none. */
export function bondSpans(flow: Pick<FlowInput, "steps">): BondSpan[] {
  return spansOfKinds(flow.steps.map(({ kind, bond }) => (kind === "bond" && !bond ? null : kind)));
}

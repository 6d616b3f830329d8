import { bondedFace, bondOn, letGoAt } from "../flow/bond.ts";
import type { FlowInput, StepKind } from "../flow/model.ts";
import type { Side } from "../vocabulary.ts";

/** A bond of a flow: its face, and the numbers of the steps that make it and take it off; `to` null when it stays on. */
export interface BondSpan {
  from: number;
  to: number | null;
  face: Side;
}

/** What of a step says where bonds begin and end. */
export interface BondingStep {
  /** null for a step that counts for none */
  kind: StepKind | null;
  /** face that a bond is on; missing: the device side */
  bondFace?: Side | null | undefined;
  /** face that a debond lets go; missing: the bond made first */
  debondFace?: Side | null | undefined;
}

/** The bonds in order, by the kinds of the steps and their faces; one on a face that is bonded already is none. */
export function spansOfKinds(steps: readonly BondingStep[]): BondSpan[] {
  const spans: BondSpan[] = [];
  for (const [index, { kind, bondFace, debondFace }] of steps.entries()) {
    const on = spans.filter(({ to }) => to === null);
    const face = bondedFace({ face: bondFace ?? null });
    if (kind === "bond" && !bondOn(on, face)) spans.push({ from: index + 1, to: null, face });
    const gone = kind === "debond" ? on[letGoAt(on, debondFace)] : undefined;
    if (gone) gone.to = index + 1;
  }
  return spans;
}

/** The bonds of a flow in order; a bond to nothing is none, nor is one that the wafer skips. */
export function bondSpans({ steps }: Pick<FlowInput, "steps">): BondSpan[] {
  return spansOfKinds(
    steps.map(({ kind, bond, debondFace, skipped }) => ({
      kind: skipped || (kind === "bond" && !bond) ? null : kind,
      bondFace: bond?.face,
      debondFace,
    })),
  );
}

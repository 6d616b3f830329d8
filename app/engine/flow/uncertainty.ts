import { standardUncertainty, type Measured } from "../measured.ts";
import type { SiteLimits } from "../rules/limits.ts";
import type { StepUncertainty } from "../rules/finding.ts";
import type { FlowInput } from "./model.ts";
import { movedWalk, nominalWalk, type ReadStep } from "./moved-walks.ts";
import { peakShape, roomShape } from "./step.ts";
import { firstTouched, unknowns } from "./unknowns.ts";

/** How much one input moves a step's sagitta: its standard uncertainty times the sensitivity, m. */
export interface Contribution {
  input: string;
  source: Measured["source"];
  contribution: number;
}

export interface FlowUncertainty extends StepUncertainty {
  /** largest first */
  budget: Contribution[];
}

/** Sagittas of a step at 25 °C and at peak, m; null where it has none. */
interface Outline {
  atRoom: number | null;
  atPeak: number | null;
}

const outline: ReadStep<Outline> = (wafer, walked) => ({
  atRoom: roomShape(wafer, walked)?.sagitta ?? null,
  atPeak: peakShape(wafer, walked)?.sagitta ?? null,
});

/**
 * Standard uncertainty of every step's sagitta at 25 °C and at peak, first order (JCGM 100:2008 5.1.2, equation 10), each
 * sensitivity from the walk itself one standard uncertainty up and down, or to one side where the other cannot be computed.
 * Only steps that an input can change are walked again. Inputs without a tolerance count as exact.
 */
export function flowUncertainty(flow: FlowInput, _limits?: SiteLimits): FlowUncertainty[] {
  const nominal = nominalWalk(flow, outline);
  const outlines = nominal.readings;
  const sum = outlines.map(() => ({ atRoom: 0, atPeak: 0, budget: [] as Contribution[] }));
  for (const unknown of unknowns(flow)) {
    const first = firstTouched(unknown);
    const u = standardUncertainty(unknown.measured);
    const up = movedWalk(flow, nominal, unknown, u, outline);
    const down = movedWalk(flow, nominal, unknown, -u, outline);
    const widths = Math.max(1, [up, down].filter(Boolean).length);
    for (let index = first; index < outlines.length; index += 1) {
      const [at, total] = [outlines[index], sum[index]];
      if (!at || !total) continue;
      // A walk that was refused stays at the nominal value; one that has come back to the nominal wafer ends early.
      const [high, low] = [up?.[index - first] ?? at, down?.[index - first] ?? at];
      const half = (pick: "atRoom" | "atPeak") => ((high[pick] ?? 0) - (low[pick] ?? 0)) / widths;
      const room = half("atRoom");
      total.atRoom += room ** 2;
      total.atPeak += half("atPeak") ** 2;
      if (room !== 0)
        total.budget.push({ input: unknown.label, source: unknown.measured.source, contribution: Math.abs(room) });
    }
  }
  return sum.map(({ atRoom, atPeak, budget }, index) => ({
    atRoom: (outlines[index]?.atRoom ?? null) === null ? null : Math.sqrt(atRoom),
    atPeak: (outlines[index]?.atPeak ?? null) === null ? null : Math.sqrt(atPeak),
    budget: budget.sort((a, b) => b.contribution - a.contribution),
  }));
}

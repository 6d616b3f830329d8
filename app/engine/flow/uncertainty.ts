import { EngineInputError } from "../errors.ts";
import { standardUncertainty, type Measured } from "../measured.ts";
import type { SiteLimits } from "../rules/limits.ts";
import type { StepUncertainty } from "../rules/finding.ts";
import type { FlowInput } from "./model.ts";
import { walkFlow, type StepState } from "./walk.ts";

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

/** One unknown of a flow: everywhere that it stands, so that a film used twice moves once. */
interface Unknown {
  label: string;
  measured: Measured;
  places: (string | number)[][];
}

/** Every input with a tolerance. The stress and elastic data of one film are one unknown wherever the film is used. */
function unknowns(flow: FlowInput): Unknown[] {
  const found = new Map<string, Unknown>();
  const note = (key: string, label: string, measured: Measured | null | undefined, ...place: (string | number)[]) => {
    if (!measured || standardUncertainty(measured) === 0) return;
    const known = found.get(key);
    if (known) known.places.push(place);
    else found.set(key, { label, measured, places: [place] });
  };
  note("wafer", "Incoming silicon thickness", flow.wafer.thickness, "wafer", "thickness");
  flow.steps.forEach((step, i) => {
    note(`silicon ${i}`, `Silicon after step ${i + 1}`, step.siliconAfter, "steps", i, "siliconAfter");
    note(`face ${i}`, `Ground face force, step ${i + 1}`, step.groundFaceForce, "steps", i, "groundFaceForce");
    step.adds.forEach((addition, j) => {
      const { film } = addition;
      const at = ["steps", i, "adds", j];
      note(`thickness ${i} ${j}`, `${film.name}, thickness at step ${i + 1}`, addition.thickness, ...at, "thickness");
      note(`stress ${film.id} ${addition.stress.value}`, `${film.name}, stress`, addition.stress, ...at, "stress");
      note(`modulus ${film.id}`, `${film.name}, modulus`, film.youngsModulus, ...at, "film", "youngsModulus");
      note(`expansion ${film.id}`, `${film.name}, expansion`, film.expansion, ...at, "film", "expansion");
      note(`yield ${film.id}`, `${film.name}, yield stress`, film.yieldStress, ...at, "film", "yieldStress");
    });
    if (!step.bond) return;
    const { carrier, material } = step.bond;
    const at = ["steps", i, "bond"];
    note(`bond thickness ${i}`, `${material.name}, thickness`, step.bond.thickness, ...at, "thickness");
    note(
      `carrier expansion ${carrier.id}`,
      `${carrier.name}, expansion`,
      carrier.expansion,
      ...at,
      "carrier",
      "expansion",
    );
    note(
      `carrier modulus ${carrier.id}`,
      `${carrier.name}, modulus`,
      carrier.youngsModulus,
      ...at,
      "carrier",
      "youngsModulus",
    );
    note(
      `carrier thickness ${carrier.id}`,
      `${carrier.name}, thickness`,
      carrier.thickness,
      ...at,
      "carrier",
      "thickness",
    );
    note(
      `locked-in ${material.id}`,
      `${material.name}, locked-in modulus`,
      material.effectiveModulus,
      ...at,
      "material",
      "effectiveModulus",
    );
    note(
      `adhesive expansion ${material.id}`,
      `${material.name}, expansion`,
      material.expansionBelow,
      ...at,
      "material",
      "expansionBelow",
    );
  });
  return [...found.values()];
}

/** A copy of the flow with one unknown moved by `by` (SI) wherever it stands; everything else is shared. */
function moved(flow: FlowInput, unknown: Unknown, by: number): FlowInput {
  const set = (node: unknown, place: (string | number)[]): unknown => {
    if (typeof node !== "object" || node === null) return node;
    const [key, ...rest] = place;
    if (key === undefined) return { ...node, value: unknown.measured.value + by };
    if (Array.isArray(node)) return node.map((item, index) => (index === key ? set(item, rest) : item));
    return { ...node, [key]: set((node as Record<string, unknown>)[key], rest) };
  };
  return unknown.places.reduce((result, place) => set(result, place) as FlowInput, flow);
}

/** The flow walked with one unknown moved; null where that leaves what can be computed, such as a negative thickness. */
function walkMoved(flow: FlowInput, limits: SiteLimits, unknown: Unknown, by: number): StepState[] | null {
  try {
    return walkFlow(moved(flow, unknown, by), limits).steps;
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}

/**
 * Standard uncertainty of every step's sagitta at 25 °C and at peak, first order (JCGM 100:2008 5.1.2, equation 10), each
 * sensitivity from the walk itself one standard uncertainty up and down, or to one side where the other cannot be computed.
 * Inputs without a tolerance count as exact.
 */
export function flowUncertainty(flow: FlowInput, limits: SiteLimits): FlowUncertainty[] {
  const sum = flow.steps.map(() => ({ atRoom: 0, atPeak: 0, budget: [] as Contribution[] }));
  const nominal = walkFlow(flow, limits).steps;
  for (const unknown of unknowns(flow)) {
    const u = standardUncertainty(unknown.measured);
    const up = walkMoved(flow, limits, unknown, u);
    const down = walkMoved(flow, limits, unknown, -u);
    const widths = Math.max(1, [up, down].filter(Boolean).length);
    sum.forEach((total, index) => {
      const half = (pick: (state: StepState) => number | undefined) => {
        const [high, low] = [(up ?? nominal)[index], (down ?? nominal)[index]];
        return high && low ? ((pick(high) ?? 0) - (pick(low) ?? 0)) / widths : 0;
      };
      const room = half((state) => state.atRoom?.sagitta);
      total.atRoom += room ** 2;
      total.atPeak += half((state) => state.atPeak?.sagitta) ** 2;
      if (room !== 0)
        total.budget.push({ input: unknown.label, source: unknown.measured.source, contribution: Math.abs(room) });
    });
  }
  return sum.map(({ atRoom, atPeak, budget }, index) => ({
    atRoom: nominal[index]?.atRoom ? Math.sqrt(atRoom) : null,
    atPeak: nominal[index]?.atPeak ? Math.sqrt(atPeak) : null,
    budget: budget.sort((a, b) => b.contribution - a.contribution),
  }));
}

import { standardUncertainty, type Measured } from "../measured.ts";
import type { FlowInput } from "./model.ts";

/** One unknown of a flow: everywhere that it stands, so that a film used twice moves once. */
export interface Unknown {
  label: string;
  measured: Measured;
  places: (string | number)[][];
}

/** Every input with a tolerance. The stress and elastic data of one film are one unknown wherever the film is used. */
export function unknowns(flow: FlowInput): Unknown[] {
  const found = new Map<string, Unknown>();
  const note = (key: string, label: string, measured: Measured | null | undefined, ...place: (string | number)[]) => {
    if (!measured || standardUncertainty(measured) === 0) return;
    const known = found.get(key);
    if (known) known.places.push(place);
    else found.set(key, { label, measured, places: [place] });
  };
  note("wafer", "Incoming silicon thickness", flow.wafer.thickness, "wafer", "thickness");
  const { incoming } = flow.wafer;
  const atWafer = ["wafer", "incoming"];
  note("bow x", "Incoming curvature along x", incoming?.curvature.x, ...atWafer, "curvature", "x");
  note("bow y", "Incoming curvature along y", incoming?.curvature.y, ...atWafer, "curvature", "y");
  note("film share", "Film part of the incoming shape", incoming?.filmShare, ...atWafer, "filmShare");
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
    note(
      `flow point ${material.id}`,
      `${material.name}, flow point`,
      material.flowPoint,
      ...at,
      "material",
      "flowPoint",
    );
  });
  return [...found.values()];
}

/** A copy of the flow with one unknown moved by `by` (SI) wherever it stands; everything else is shared. */
export function moved(flow: FlowInput, unknown: Unknown, by: number): FlowInput {
  const set = (node: unknown, place: (string | number)[], depth: number): unknown => {
    if (typeof node !== "object" || node === null) return node;
    const key = place[depth];
    if (key === undefined) return { ...node, value: unknown.measured.value + by };
    if (Array.isArray(node)) {
      const copy: unknown[] = [...(node as unknown[])];
      if (typeof key === "number") copy[key] = set(copy[key], place, depth + 1);
      return copy;
    }
    return { ...node, [key]: set((node as Record<string, unknown>)[key], place, depth + 1) };
  };
  return unknown.places.reduce((result, place) => set(result, place, 0) as FlowInput, flow);
}

/** The first step, by index, whose result an unknown can change. */
export function firstTouched({ places }: Unknown): number {
  return Math.min(...places.map(([part, index]) => (part === "steps" && typeof index === "number" ? index : 0)));
}

/** The last step, by index, that states the unknown. */
export function lastTouched({ places }: Unknown): number {
  return Math.max(...places.map(([part, index]) => (part === "steps" && typeof index === "number" ? index : 0)));
}

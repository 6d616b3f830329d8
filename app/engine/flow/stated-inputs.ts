import type { Measured } from "../measured.ts";
import type { SourceKind } from "../vocabulary.ts";
import type { FlowInput } from "./model.ts";

/** One stated input of a flow, with the first step that uses it. */
export interface StatedInput {
  step: number;
  what: string;
  source: SourceKind;
}

/** Every stated value that a flow's bows and its thickness budget rest on, each once however often it is used; assumed if any of its uses is. */
export function statedInputs(flow: FlowInput): StatedInput[] {
  const found = new Map<string, StatedInput>();
  const note = (step: number, what: string, measured: Measured | null | undefined) => {
    if (!measured) return;
    const known = found.get(what);
    if (!known || (measured.source === "assumed" && known.source !== "assumed"))
      found.set(what, { step, what, source: measured.source });
  };
  note(1, "Incoming silicon thickness", flow.wafer.thickness);
  flow.steps.forEach((step, index) => {
    const number = index + 1;
    note(number, `Silicon after step ${number}`, step.siliconAfter);
    note(number, `Ground face force at step ${number}`, step.groundFaceForce);
    for (const { film, thickness, stress } of step.adds) {
      note(number, `${film.name}: stress`, stress);
      note(number, `${film.name}: thickness`, thickness);
      note(number, `${film.name}: modulus`, film.youngsModulus);
      note(number, `${film.name}: expansion`, film.expansion);
      note(number, `${film.name}: yield stress`, film.yieldStress);
    }
    note(number, `Bump height from step ${number}`, step.bumps?.height);
    note(number, `Force that the bumps of step ${number} stand`, step.bumps?.standsPeelForce);
    note(number, `Topography from step ${number}`, step.topography);
    note(number, `Protrusion of the vias at step ${number}`, step.viaProtrusion);
    note(number, `Thickness variation of step ${number}`, step.thicknessVariation);
    if (!step.bond) return;
    note(number, `${step.bond.carrier.name}: thickness variation`, step.bond.carrier.thicknessVariation);
    note(number, `${step.bond.material.name}: thickness variation`, step.bond.material.thicknessVariationShare);
    note(number, `${step.bond.material.name}: peel force`, step.bond.material.peelForce);
    note(number, `${step.bond.material.name}: bend radius at the peel`, step.bond.material.peelRadius);
    note(number, `${step.bond.carrier.name}: expansion`, step.bond.carrier.expansion);
    note(number, `${step.bond.material.name}: locked-in modulus`, step.bond.material.effectiveModulus);
    note(number, `${step.bond.material.name}: thickness`, step.bond.thickness);
  });
  return [...found.values()];
}

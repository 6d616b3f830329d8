import type { Measured } from "#app/engine/measured.ts";
import { incomingShapeTexts, measuredText, type IncomingShape } from "#app/lib/form-values.ts";
import type { MeasuredText } from "../forms/MeasuredField.tsx";

/** The head of a flow as the text of its form. */
export type FlowFormValues = {
  program: string;
  name: string;
  note: string;
  silicon: string;
  incomingThickness: MeasuredText;
  incomingBowAlong: MeasuredText;
  incomingBowAcross: MeasuredText;
  incomingFilmShare: MeasuredText;
  waferKind: string;
  gateBow: MeasuredText;
  gateWarp: MeasuredText;
  carrier: string;
  bondingMaterial: string;
};

interface FlowHead extends IncomingShape {
  program: { id: string };
  name: string;
  note: string;
  silicon: { id: string };
  incomingThickness: Measured;
  waferKind: string;
  gateBow: Measured | null;
  gateWarp: Measured | null;
}

export function flowFormValues(flow: FlowHead): Partial<FlowFormValues> {
  return {
    program: flow.program.id,
    name: flow.name,
    note: flow.note,
    silicon: flow.silicon.id,
    incomingThickness: measuredText(flow.incomingThickness, "length", { unit: "µm" }),
    ...incomingShapeTexts(flow),
    waferKind: flow.waferKind,
    gateBow: measuredText(flow.gateBow, "length", { unit: "µm" }),
    gateWarp: measuredText(flow.gateWarp, "length", { unit: "µm" }),
  };
}

import type {
  BondingMaterialInput,
  CarrierInput,
  EquipmentInput,
  FilmInput,
  FlowInput,
  StepInput,
  StepKind,
} from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Exposure, Holding, Side } from "#app/engine/vocabulary.ts";
import type { RecordStamp } from "../record.server.ts";

/** A film that a step adds or takes off, as screens and the engine need it. */
export interface StepFilmDetail {
  change: "adds" | "removes";
  side: Side;
  film: FilmInput;
  thickness: Measured | null;
  ownStress: Measured | null;
  /** own, else the film's */
  stress: Measured;
  coverage: number;
}

export interface StepDetail {
  id: string;
  kind: StepKind;
  title: string;
  peakTemperature: number;
  holdTime: number | null;
  equipment: EquipmentInput | null;
  exposures: Exposure[];
  planned: Holding;
  siliconAfter: Measured | null;
  trimWidth: Measured | null;
  trimDepth: Measured | null;
  carrier: CarrierInput | null;
  bondingMaterial: BondingMaterialInput | null;
  bondThickness: Measured | null;
  groundFaceForce: Measured | null;
  films: StepFilmDetail[];
}

export interface FlowDetail {
  id: string;
  name: string;
  note: string;
  program: { id: string; name: string; slug: string };
  silicon: { id: string; name: string; diameter: number; orientation: "100" | "111" };
  incomingThickness: Measured;
  steps: StepDetail[];
  stamp: RecordStamp;
  mayEdit: boolean;
  mayAssess: boolean;
}

/** The flow as the engine takes it, complete in itself. */
export function flowInputOf(flow: Pick<FlowDetail, "name" | "silicon" | "incomingThickness" | "steps">): FlowInput {
  const { name, diameter, orientation } = flow.silicon;
  return {
    name: flow.name,
    wafer: { name, diameter, orientation, thickness: flow.incomingThickness },
    steps: flow.steps.map(stepInputOf),
  };
}

function stepInputOf(step: StepDetail): StepInput {
  const { carrier, bondingMaterial, bondThickness, trimWidth, trimDepth } = step;
  return {
    kind: step.kind,
    title: step.title,
    peakTemperature: step.peakTemperature,
    holdTime: step.holdTime,
    equipment: step.equipment,
    exposures: step.exposures,
    planned: step.planned,
    siliconAfter: step.siliconAfter,
    adds: step.films.flatMap(({ change, side, film, thickness, stress, coverage }) =>
      change === "adds" && thickness ? [{ side, film, thickness, stress, coverage }] : [],
    ),
    removes: step.films.flatMap(({ change, side, film }) =>
      change === "removes" ? [{ side, filmId: film.id, filmName: film.name }] : [],
    ),
    edgeTrim: step.kind === "edge trim" && trimWidth && trimDepth ? { width: trimWidth, depth: trimDepth } : null,
    bond:
      step.kind === "bond" && carrier && bondingMaterial && bondThickness
        ? { carrier, material: bondingMaterial, thickness: bondThickness }
        : null,
    groundFaceForce: step.groundFaceForce,
  };
}

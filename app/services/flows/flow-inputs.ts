import type { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import type { CarrierUnit } from "#app/db/entities/carrier-unit.ts";
import type { Carrier } from "#app/db/entities/carrier.ts";
import type { Equipment } from "#app/db/entities/equipment.ts";
import type { Film } from "#app/db/entities/film.ts";
import type { Tape } from "#app/db/entities/tape.ts";
import type { TapeInput } from "#app/engine/flow/handling-inputs.ts";
import type {
  BondingMaterialInput,
  CarrierInput,
  EquipmentInput,
  FilmInput,
  FlowInput,
  IncomingShape,
  StepInput,
} from "#app/engine/flow/model.ts";
import { linesPattern } from "#app/engine/patterned/pattern.ts";
import { incomingFromBows } from "#app/engine/flow/silicon.ts";
import { expansionCurveOf, meanOfCurve } from "#app/lib/expansion-rows.ts";
import { bondHandlingOf, stepHandlingOf, stepRunOf } from "#app/lib/flow-handling.ts";
import {
  bondingMaterialHandlingOf,
  carrierHandlingOf,
  pieceHandlingOf,
  equipmentHandlingOf,
  filmHandlingOf,
  tapeHandlingOf,
} from "#app/lib/library-handling.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import type { FlowDetail, StepDetail } from "#app/schemas/flow-view.ts";

/**
 * Flows and library entities as the engine takes them: plain, with the columns that it knows. A column that is blank is null, not
 * left out, so that a stored assessment can tell when somebody fills it in.
 */

export function filmInput({ id, name, kind, ...film }: Film): FilmInput {
  return {
    id,
    name,
    kind,
    youngsModulus: film.youngsModulus,
    poissonsRatio: film.poissonsRatio,
    expansion: film.expansion,
    yieldStress: film.yieldStress ?? null,
    zeroStressTemperature: film.zeroStressTemperature ?? null,
    temperatureLimit: film.temperatureLimit ?? null,
    ...filmHandlingOf(film.handling),
  };
}

export function carrierInput({ id, name, material, ...carrier }: Carrier | LibraryRecords["carrier"]): CarrierInput {
  const { meanExpansionFrom: from, meanExpansionTo: to, expansionCurve: curve } = carrier;
  return {
    id,
    name,
    material,
    thickness: carrier.thickness,
    diameter: carrier.diameter,
    youngsModulus: carrier.youngsModulus,
    poissonsRatio: carrier.poissonsRatio,
    // The curve's own mean stands for what it is uncertain by and where it comes from.
    expansion: carrier.expansion ?? (curve ? meanOfCurve(curve) : null),
    ...(curve && { expansionCurve: expansionCurveOf(curve) }),
    meanExpansionOver: typeof from === "number" && typeof to === "number" ? { from, to } : null,
    temperatureLimit: carrier.temperatureLimit,
    ...carrierHandlingOf(carrier),
  };
}

/** One piece of a kind of carrier: its mark, its uses and whether it may be used are its own. */
export function pieceInput(carrier: Carrier, piece: CarrierUnit): CarrierInput {
  return { ...carrierInput(carrier), ...pieceHandlingOf(piece) };
}

export function bondingMaterialInput({ id, name, ...material }: BondingMaterial): BondingMaterialInput {
  return {
    id,
    name,
    effectiveModulus: material.effectiveModulus,
    poissonsRatio: material.poissonsRatio,
    expansionBelow: material.expansionBelow,
    expansionAbove: material.expansionAbove,
    softening: material.softening ?? null,
    glassTransition: material.glassTransition ?? null,
    flowPoint: material.flowPoint ?? null,
    flows: material.flows,
    bondTemperature: material.bondTemperature,
    temperatureLimit: material.temperatureLimit,
    release: material.release,
    releaseTemperature: material.releaseTemperature,
    ...bondingMaterialHandlingOf(material),
  };
}

export function equipmentInput({ id, name, ...tool }: Equipment): EquipmentInput {
  return {
    id,
    name,
    warpLimitEdgesUp: tool.warpLimitEdgesUp ?? null,
    warpLimitEdgesDown: tool.warpLimitEdgesDown ?? null,
    leastUnsupportedThickness: tool.leastUnsupportedThickness ?? null,
    atPeak: tool.atPeak,
    largestDiameter: tool.largestDiameter,
    ...equipmentHandlingOf(tool.handling),
  };
}

export function tapeInput({ id, name, handling, ...tape }: Tape): TapeInput & { id: string } {
  return {
    id,
    name,
    temperatureLimit: tape.temperatureLimit ?? null,
    embeddingDepth: tape.embeddingDepth ?? null,
    thicknessVariation: tape.thicknessVariation ?? null,
    longestTime: tape.longestTime ?? null,
    ...tapeHandlingOf(handling),
  };
}

/** The flow as the engine takes it, complete in itself. */
export function flowInputOf(
  flow: Pick<FlowDetail, Exclude<keyof FlowDetail, "id" | "note" | "program" | "stamp" | "mayEdit" | "mayAssess">>,
): FlowInput {
  const { name, diameter, orientation } = flow.silicon;
  const { waferKind, gateBow: bow, gateWarp: warp } = flow;
  return {
    name: flow.name,
    wafer: {
      name,
      diameter,
      orientation,
      thickness: flow.incomingThickness,
      incoming: incomingOf(flow),
      ...(waferKind === "silicon wafer" ? {} : { kind: waferKind }),
    },
    ...(bow || warp ? { gate: { ...(bow && { bow }), ...(warp && { warp }) } } : {}),
    steps: flow.steps.map(stepInputOf),
  };
}

function incomingOf({
  silicon,
  incomingBowAlong: bowX,
  incomingBowAcross: bowY,
  incomingFilmShare: filmShare,
}: Parameters<typeof flowInputOf>[0]): IncomingShape | null {
  return bowX && bowY ? incomingFromBows({ radius: silicon.diameter / 2, bowX, bowY, filmShare }) : null;
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
    adds: step.films.flatMap(({ change, side, film, thickness, stress, stressRecord, coverage, lines }) =>
      change === "adds" && thickness
        ? [
            {
              side,
              film,
              thickness,
              stress,
              coverage,
              ...(lines ? { pattern: linesPattern(lines, coverage) } : {}),
              ...(stressRecord ? { stressRecord } : {}),
            },
          ]
        : [],
    ),
    removes: step.films.flatMap(({ change, side, film }) =>
      change === "removes" ? [{ side, filmId: film.id, filmName: film.name }] : [],
    ),
    edgeTrim: step.kind === "edge trim" && trimWidth && trimDepth ? { width: trimWidth, depth: trimDepth } : null,
    bond:
      step.kind === "bond" && carrier && bondingMaterial && bondThickness
        ? { carrier, material: bondingMaterial, thickness: bondThickness, ...bondHandlingOf(step.handling) }
        : null,
    groundFaceForce: step.groundFaceForce,
    ...stepRunOf(step.handling),
    ...stepHandlingOf(step.handling, step.tape),
  };
}

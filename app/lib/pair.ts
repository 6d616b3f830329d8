import { lockTemperature } from "#app/engine/flow/layers.ts";
import type {
  BondingMaterialInput,
  CarrierInput,
  CarrierMaterial,
  FlowInput,
  ReleaseMethod,
  StepInput,
} from "#app/engine/flow/model.ts";
import { flowUncertainty, type Contribution } from "#app/engine/flow/uncertainty.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import type { ShapeRegime, ShapeWord } from "#app/engine/vocabulary.ts";

/** A blank wafer and a carrier, to be bonded and thinned. SI units. */
export interface PairInput {
  wafer: FlowInput["wafer"];
  /** silicon left after grinding, at most the wafer's own thickness; null leaves the wafer as it is */
  siliconLeft: Measured | null;
  carrier: CarrierInput;
  material: BondingMaterialInput;
  bondThickness: Measured;
}

/** How a pair lies at 25 °C, carrier down. */
export interface PairEstimate {
  lies: ShapeWord;
  regime: ShapeRegime;
  /** peak to valley, m */
  warp: number;
  /** standard bow, device side up, m; of a pair that rolls it is not to be shown */
  bow: number;
  rollRadius: number | null;
  /** standard uncertainty of the bow from the tolerances given, m */
  uncertainty: number;
  /** change of warp, m, when the carrier expands by 0.1 ppm/K more or less; null for one with silicon's own curve */
  perTenthPpm: number | null;
  /** where the uncertainty comes from, largest first */
  budget: Contribution[];
  /** temperature from which down the pair is coupled, K */
  locksAt: number;
}

const TENTH_PPM = 1e-7;

const PLAIN: Omit<StepInput, "kind" | "title" | "peakTemperature" | "planned" | "siliconAfter" | "bond"> = {
  holdTime: null,
  equipment: null,
  exposures: [],
  adds: [],
  removes: [],
  edgeTrim: null,
  groundFaceForce: null,
};

function flowOf({ wafer, siliconLeft, carrier, material, bondThickness }: PairInput): FlowInput {
  const bond: StepInput = {
    ...PLAIN,
    kind: "bond",
    title: "Bond",
    peakTemperature: material.bondTemperature.value,
    planned: "carrier",
    siliconAfter: null,
    bond: { carrier, material, thickness: bondThickness },
  };
  const grind: StepInput = {
    ...PLAIN,
    kind: "grind",
    title: "Grind",
    peakTemperature: ROOM_TEMPERATURE,
    planned: "carrier",
    siliconAfter: siliconLeft,
    bond: null,
  };
  return { name: "Pair", wafer, steps: [bond, grind] };
}

/**
 * Bow of a blank wafer bonded to a carrier, by the same walk that assesses flows: bonded at the material's bond temperature, then
 * thinned and cooled to 25 °C, gravity and ground face left out.
 * @throws EngineInputError when an input is out of range
 */
export function estimatePair(input: PairInput, limits: SiteLimits): PairEstimate {
  const flow = flowOf(input);
  const state = walkFlow(flow, limits).steps.at(-1);
  const spread = flowUncertainty(flow, limits).at(-1);
  if (!state?.atRoom || !spread) throw new Error("A pair always has a shape of its own.");
  const { sagitta, warp, regime, rollRadius } = state.atRoom;
  return {
    lies: state.lies,
    regime,
    warp,
    bow: standardBow(sagitta),
    rollRadius,
    uncertainty: spread.atRoom ?? 0,
    perTenthPpm: perTenthPpm(input, limits),
    budget: spread.budget,
    locksAt: lockTemperature({
      carrier: input.carrier,
      material: input.material,
      thickness: input.bondThickness,
      bondTemperature: input.material.bondTemperature.value,
    }),
  };
}

function perTenthPpm(input: PairInput, limits: SiteLimits): number | null {
  const { carrier } = input;
  const { expansion } = carrier;
  if (expansion === null) return null;
  const sagittaAt = (by: number) => {
    const moved = { ...carrier, expansion: { ...expansion, value: expansion.value + by } };
    return walkFlow(flowOf({ ...input, carrier: moved }), limits).steps.at(-1)?.atRoom?.sagitta ?? 0;
  };
  return Math.abs(sagittaAt(TENTH_PPM) - sagittaAt(-TENTH_PPM)) / 2;
}

/** Why a bonding material could not let go of this carrier, in a sentence; null when nothing known speaks against it. */
export function cannotRelease(
  release: ReleaseMethod,
  carrier: { material: CarrierMaterial; perforated: boolean },
): string | null {
  if (release.includes("laser through glass") && carrier.material !== "glass")
    return "It lets go by laser through glass; this carrier is silicon.";
  if (release === "solvent through perforated carrier" && !carrier.perforated)
    return "It lets go by solvent through openings; this carrier is not perforated.";
  return null;
}

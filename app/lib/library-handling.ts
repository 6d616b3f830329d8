import type {
  BondingMaterialHandling,
  CarrierHandling,
  EquipmentHandling,
  FilmHandling,
  StressRecord,
} from "#app/engine/flow/handling-inputs.ts";
import type { Measured } from "#app/engine/measured.ts";
import type {
  BondingMaterialHandlingValues,
  CarrierHandlingValues,
  EquipmentHandlingValues,
  FilmHandlingValues,
  TapeHandlingValues,
} from "#app/schemas/library-handling.ts";
import type { CarrierUnitRow } from "./carrier-units.ts";
import { given } from "./given.ts";

interface CarrierFacts {
  density: Measured;
  thicknessVariation: Measured;
  passesUltraviolet: boolean;
  passesInfrared: boolean;
  perforated: boolean;
  reuseLimit: number;
  handling: CarrierHandlingValues;
}

/** What the handling rules ask of a kind of carrier; which piece it is, and how often it was used, is no matter of a plan. */
export function carrierHandlingOf({ reuseLimit, handling, ...carrier }: CarrierFacts): CarrierHandling {
  const { density, thicknessVariation, passesUltraviolet, passesInfrared, perforated } = carrier;
  return {
    density,
    thicknessVariation,
    passesUltraviolet,
    passesInfrared,
    perforated,
    useLimit: reuseLimit,
    ...given(handling),
  };
}

/** A piece as its kind's handling takes it. */
export interface PieceFacts extends Pick<CarrierUnitRow, "mark" | "uses" | "state"> {
  thicknessVariation?: Measured | null;
}

/** What the handling rules ask of one piece of a carrier. Its record counts the uses that are over. */
export function pieceHandlingOf({ mark, uses, state, thicknessVariation }: PieceFacts): CarrierHandling {
  return {
    identity: mark,
    uses,
    ...given({ thicknessVariation, outOfUse: state === "scrapped" ? state : null }),
  };
}

interface MaterialFacts {
  thicknessVariationShare: Measured;
  leastThickness: number;
  mostThickness: number;
  thermalCycles?: number | null;
  handling: BondingMaterialHandlingValues;
}

type ResistanceValues = Omit<TapeHandlingValues, "releasesInLight">;

/** What is given of what a material stands, as the rules take it; null when nothing is. */
function resistancesOf({ vacuum, plasma, solvent, acid, base, ultraviolet, attackedBy }: ResistanceValues) {
  const resistances = given({
    vacuum,
    plasma,
    solvent,
    acid,
    base,
    ultraviolet,
    attackedBy: attackedBy.length > 0 ? attackedBy : null,
  });
  return Object.keys(resistances).length > 0 ? resistances : null;
}

/** What the handling rules ask of a bonding material. */
export function bondingMaterialHandlingOf(material: MaterialFacts): BondingMaterialHandling {
  const { thicknessVariationShare, leastThickness, mostThickness, thermalCycles, handling } = material;
  const { vacuum, plasma, solvent, acid, base, ultraviolet, attackedBy, ...rest } = handling;
  const resistances = resistancesOf({ vacuum, plasma, solvent, acid, base, ultraviolet, attackedBy });
  return {
    thicknessVariationShare,
    leastThickness,
    mostThickness,
    ...given({ resistances, thermalCycles: cycles(thermalCycles) }),
    ...given(rest),
  };
}

/** A count of heatings is typed without a source of its own. */
const cycles = (count: number | null | undefined): Measured | null =>
  typeof count === "number"
    ? { value: count, tolerance: null, source: "assumed", note: "no source is kept with this count" }
    : null;

/** What a tape stands and whether light lets it go, as the engine takes it. */
export function tapeHandlingOf({ releasesInLight, ...stands }: TapeHandlingValues) {
  return { releasesInLight, resistances: resistancesOf(stands) };
}

/** What the handling rules ask of a tool. */
export function equipmentHandlingOf({
  contactFace,
  contactMeans,
  ...tool
}: EquipmentHandlingValues): EquipmentHandling {
  const contact = contactFace && contactMeans ? { face: contactFace, means: contactMeans } : null;
  return given({ ...tool, contact });
}

/** What the handling rules ask of a film's material. */
export function filmHandlingOf({ solderMelting }: FilmHandlingValues): FilmHandling {
  return given({ solderMelting });
}

/** What the stress that a film's record states was measured on; null when nothing of it is given. */
export function stressRecordOf({ stress, handling }: { stress: Measured; handling: FilmHandlingValues }) {
  const { stressState, stressFilmThickness, monitorThickness, monitorDiameter } = handling;
  const record: StressRecord = given({
    state: stressState,
    filmThickness: stressFilmThickness,
    monitorThickness,
    monitorDiameter,
  });
  return Object.keys(record).length > 0 ? { ...record, ...given({ on: stress.on }) } : null;
}

import type {
  BondingMaterialHandlingValues,
  CarrierHandlingValues,
  EquipmentHandlingValues,
  FilmHandlingValues,
  TapeHandlingValues,
} from "#app/schemas/library-handling.ts";

/** What the handling rules ask of a record of the library, with nothing given yet. */

export const BLANK_CARRIER_HANDLING: CarrierHandlingValues = {
  metalInLight: null,
  conductiveCoating: null,
  seenBySensors: null,
};

const NO_RESISTANCES = {
  vacuum: null,
  plasma: null,
  solvent: null,
  acid: null,
  base: null,
  ultraviolet: null,
  attackedBy: [],
};

export const BLANK_TAPE_HANDLING: TapeHandlingValues = { ...NO_RESISTANCES, releasesInLight: null };

export const BLANK_MATERIAL_HANDLING: BondingMaterialHandlingValues = {
  ...NO_RESISTANCES,
  remover: null,
  vacuumTemperatureLimit: null,
  weightLoss: null,
  limitTime: null,
  thermalTime: null,
  releaseLight: null,
  peelForce: null,
  peelRadius: null,
};

export const BLANK_TOOL_HANDLING: EquipmentHandlingValues = {
  clamping: null,
  seal: null,
  sealGap: null,
  slotClearance: null,
  weightLimit: null,
  totalThicknessLimit: null,
  sensesOptically: null,
  contactFace: null,
  contactMeans: null,
  ioniser: null,
};

export const BLANK_FILM_HANDLING: FilmHandlingValues = {
  solderMelting: null,
  stressState: null,
  stressFilmThickness: null,
  monitorThickness: null,
  monitorDiameter: null,
};

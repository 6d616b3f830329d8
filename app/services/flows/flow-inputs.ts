import type { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import type { Carrier } from "#app/db/entities/carrier.ts";
import type { Equipment } from "#app/db/entities/equipment.ts";
import type { Film } from "#app/db/entities/film.ts";
import type { BondingMaterialInput, CarrierInput, EquipmentInput, FilmInput } from "#app/engine/flow/model.ts";

/** Library entities as the engine takes them: plain, with the columns that it knows. */

export function filmInput({ id, name, kind, ...film }: Film): FilmInput {
  return {
    id,
    name,
    kind,
    youngsModulus: film.youngsModulus,
    poissonsRatio: film.poissonsRatio,
    expansion: film.expansion,
    yieldStress: film.yieldStress ?? null,
    temperatureLimit: film.temperatureLimit ?? null,
  };
}

export function carrierInput({ id, name, material, ...carrier }: Carrier): CarrierInput {
  return {
    id,
    name,
    material,
    thickness: carrier.thickness,
    diameter: carrier.diameter,
    youngsModulus: carrier.youngsModulus,
    poissonsRatio: carrier.poissonsRatio,
    expansion: carrier.expansion ?? null,
    temperatureLimit: carrier.temperatureLimit,
  };
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
    flows: material.flows,
    bondTemperature: material.bondTemperature,
    temperatureLimit: material.temperatureLimit,
    release: material.release,
    releaseTemperature: material.releaseTemperature,
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
  };
}

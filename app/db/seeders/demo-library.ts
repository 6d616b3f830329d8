import type { EntityManager } from "@mikro-orm/postgresql";
import { BLANK_CARRIER_HANDLING, BLANK_FILM_HANDLING, BLANK_MATERIAL_HANDLING } from "#app/lib/blank-handling.ts";
import { BondingMaterial } from "../entities/bonding-material.ts";
import { CarrierUnit } from "../entities/carrier-unit.ts";
import { Carrier } from "../entities/carrier.ts";
import { Film } from "../entities/film.ts";
import { Tape } from "../entities/tape.ts";
import { DEMO_BONDING_MATERIALS, DEMO_CARRIERS, type DemoBondingMaterial } from "./demo-bonding.ts";
import { DEMO_FILMS } from "./demo-films.ts";
import { celsius, measured } from "./measured.ts";
import { DEMO_TAPES } from "./reference-tapes.ts";
import { delivered } from "./reference-seeder.ts";

const MEASURED_ON = "2026-10-21";

/** What its data sheet says of chemicals and vacuum, as the handling rules take it. */
function handlingOf({ stands, attackedBy = [], vacuumLimit, weightLoss }: DemoBondingMaterial) {
  const sheet = (value: number | undefined) =>
    value === undefined ? null : measured(value, null, "supplier", "data sheet");
  return {
    ...BLANK_MATERIAL_HANDLING,
    ...stands,
    attackedBy,
    vacuumTemperatureLimit: sheet(vacuumLimit === undefined ? undefined : celsius(vacuumLimit)),
    weightLoss: sheet(weightLoss),
  };
}

type Named = typeof Film | typeof Carrier | typeof Tape | typeof BondingMaterial;

/** What the site has no record of that name of yet; one that is there is used as it is. */
async function missing<Row extends { name: string }>(em: EntityManager, entity: Named, rows: readonly Row[]) {
  const there = new Set((await em.findAll(entity as typeof Film)).map(({ name }) => name));
  return rows.filter(({ name }) => !there.has(name));
}

/** Films, carriers and bonding materials of the invented pilot line. */
export async function addDemoLibrary(em: EntityManager): Promise<void> {
  for (const film of await missing(em, Film, DEMO_FILMS)) {
    const on = film.source === "measured here" ? MEASURED_ON : null;
    const property = (value: number, tolerance: number | null) =>
      measured(value, tolerance, film.source, film.note, on);
    em.create(Film, {
      ...delivered(),
      name: film.name,
      kind: film.kind,
      note: "",
      stressState: film.stressState,
      stress: property(film.stress * 1e6, film.stressTolerance * 1e6),
      youngsModulus: property(film.youngsModulus * 1e9, film.youngsModulus * 0.05 * 1e9),
      poissonsRatio: property(film.poissonsRatio, 0.02),
      expansion: property(film.expansion * 1e-6, film.expansion * 0.03 * 1e-6),
      yieldStress: film.yieldStress === null ? null : property(film.yieldStress * 1e6, film.yieldStress * 0.1 * 1e6),
      zeroStressTemperature: null,
      temperatureLimit: property(celsius(film.limit), null),
      handling: {
        ...BLANK_FILM_HANDLING,
        solderMelting: film.melting === undefined ? null : property(celsius(film.melting), null),
      },
    });
  }
  for (const carrier of await missing(em, Carrier, DEMO_CARRIERS)) {
    const property = (value: number, tolerance: number | null) => measured(value, tolerance, "supplier");
    const kind = em.create(Carrier, {
      ...delivered(),
      name: carrier.name,
      material: carrier.material,
      note: "",
      diameter: carrier.diameter / 1e3,
      thickness: property(carrier.thickness * 1e-6, 10e-6),
      youngsModulus: property(carrier.youngsModulus * 1e9, 1e9),
      poissonsRatio: property(carrier.poissonsRatio, 0.01),
      expansion: carrier.expansion === null ? null : property(carrier.expansion * 1e-6, 0.1e-6),
      expansionRange: carrier.expansion === null ? "silicon's own curve" : "25 to 150 °C mean",
      meanExpansionFrom: carrier.expansion === null ? null : celsius(25),
      meanExpansionTo: carrier.expansion === null ? null : celsius(150),
      expansionCurve: null,
      density: property(carrier.density, 10),
      thicknessVariation: property(carrier.thicknessVariation * 1e-6, null),
      temperatureLimit: property(celsius(carrier.limit), null),
      passesUltraviolet: carrier.passesUltraviolet,
      passesInfrared: true,
      perforated: carrier.perforated,
      reuseLimit: carrier.reuseLimit,
      handling: BLANK_CARRIER_HANDLING,
    });
    for (const piece of carrier.pieces ?? [])
      em.create(CarrierUnit, { ...delivered(), carrier: kind, thicknessVariation: null, ...piece });
  }
  for (const tape of await missing(em, Tape, DEMO_TAPES)) em.create(Tape, { ...delivered(), ...tape });
  for (const material of await missing(em, BondingMaterial, DEMO_BONDING_MATERIALS)) {
    const property = (value: number, tolerance: number | null) => measured(value, tolerance, "supplier");
    em.create(BondingMaterial, {
      ...delivered(),
      name: material.name,
      note: "",
      effectiveModulus: measured(
        material.effectiveModulus * 1e9,
        material.effectiveModulus * 0.3 * 1e9,
        "assumed",
        "to be calibrated on measured pairs",
      ),
      dataSheetModulus: property(material.dataSheetModulus * 1e9, null),
      poissonsRatio: property(material.poissonsRatio, 0.02),
      expansionBelow: property(material.expansionBelow * 1e-6, material.expansionBelow * 0.1 * 1e-6),
      expansionAbove: property(material.expansionAbove * 1e-6, material.expansionAbove * 0.1 * 1e-6),
      softening: material.softening === null ? null : property(celsius(material.softening), 5),
      glassTransition: null,
      flows: material.flows,
      flowPoint: null,
      bondTemperature: property(celsius(material.bond), 5),
      temperatureLimit: property(celsius(material.limit), null),
      leastThickness: material.thickness[0] * 1e-6,
      mostThickness: material.thickness[1] * 1e-6,
      thicknessVariationShare: property(material.thicknessVariation / 100, null),
      release: material.release,
      releaseTemperature: property(celsius(material.releaseAt), 5),
      thermalCycles: material.thermalCycles,
      vacuum: material.vacuum,
      solvent: material.solvent,
      acid: material.acid,
      base: material.base,
      handling: handlingOf(material),
    });
  }
}

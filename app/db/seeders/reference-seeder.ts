import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Seeder } from "@mikro-orm/seeder";
import { LIMIT_DEFINITIONS, type LimitKey } from "#app/engine/rules/limits.ts";
import {
  BLANK_CARRIER_HANDLING,
  BLANK_FILM_HANDLING,
  BLANK_MATERIAL_HANDLING,
  BLANK_TOOL_HANDLING,
} from "#app/lib/blank-handling.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { noteScope } from "#app/server/audit.server.ts";
import { BondingMaterial } from "../entities/bonding-material.ts";
import { Carrier } from "../entities/carrier.ts";
import { Equipment } from "../entities/equipment.ts";
import { Film } from "../entities/film.ts";
import { Silicon } from "../entities/silicon.ts";
import { FlowTemplate } from "../entities/flow-template.ts";
import { SiteLimit } from "../entities/site-limit.ts";
import { StepTemplate } from "../entities/step-template.ts";
import { Tape } from "../entities/tape.ts";
import { celsius, measured } from "./measured.ts";
import { REFERENCE_BONDING_MATERIALS, REFERENCE_CARRIERS, REFERENCE_SILICON } from "./reference-bonding.ts";
import { REFERENCE_EQUIPMENT, type ReferenceTool } from "./reference-equipment.ts";
import { REFERENCE_FILMS } from "./reference-films.ts";
import { REFERENCE_TAPES } from "./reference-tapes.ts";
import { seedLibrary } from "./seed-library.ts";
import { TEMPLATE_FLOWS, templateSteps } from "./template-flows.ts";

/** Who made a seeded record: nobody, it came with Planeward. */
export const delivered = () => ({
  id: randomUUID(),
  createdAt: new Date(),
  createdBy: null,
  updatedAt: new Date(),
  updatedBy: null,
});

/** Data that every site starts with. Adds what is not there yet by name and never changes what somebody has edited. */
export class ReferenceSeeder extends Seeder {
  override async run(em: EntityManager): Promise<void> {
    noteScope(em, { personId: null, requestId: "reference data" });
    const limits = new Set((await em.findAll(SiteLimit)).map(({ key }) => key));
    for (const [key, { value, source }] of Object.entries(LIMIT_DEFINITIONS))
      if (!limits.has(key as LimitKey)) em.create(SiteLimit, { ...delivered(), key: key as LimitKey, value, source });

    const films = new Set((await em.findAll(Film)).map(({ name }) => name));
    for (const film of REFERENCE_FILMS)
      if (!films.has(film.name))
        em.create(Film, { ...delivered(), handling: BLANK_FILM_HANDLING, zeroStressTemperature: null, ...film });

    const silicon = new Set((await em.findAll(Silicon)).map(({ name }) => name));
    for (const wafer of REFERENCE_SILICON)
      if (!silicon.has(wafer.name)) em.create(Silicon, { ...delivered(), note: "", ...wafer });

    const carriers = new Set((await em.findAll(Carrier)).map(({ name }) => name));
    for (const carrier of REFERENCE_CARRIERS)
      if (!carriers.has(carrier.name))
        em.create(Carrier, {
          ...delivered(),
          note: "",
          perforated: false,
          reuseLimit: 20,
          handling: BLANK_CARRIER_HANDLING,
          temperatureLimit: measured(celsius(400), null, "assumed", "common practice, no source"),
          ...carrier,
        });

    const tools = new Set((await em.findAll(Equipment)).map(({ name }) => name));
    for (const tool of REFERENCE_EQUIPMENT) if (!tools.has(tool.name)) em.create(Equipment, equipmentFrom(tool));

    const materials = new Set((await em.findAll(BondingMaterial)).map(({ name }) => name));
    for (const material of REFERENCE_BONDING_MATERIALS)
      if (!materials.has(material.name))
        em.create(BondingMaterial, {
          ...delivered(),
          note: "Ranges of the trade: put your own material's data in its place.",
          thicknessVariationShare: measured(0.05, 0.02, "assumed", "common practice, no source"),
          thermalCycles: null,
          vacuum: "not known",
          solvent: "not known",
          acid: "not known",
          base: "not known",
          glassTransition: null,
          flowPoint: null,
          handling: BLANK_MATERIAL_HANDLING,
          ...material,
        });

    const tapes = new Set((await em.findAll(Tape)).map(({ name }) => name));
    for (const tape of REFERENCE_TAPES) if (!tapes.has(tape.name)) em.create(Tape, { ...delivered(), ...tape });
    await em.flush();
    await addTemplates(em);
  }
}

/** Flow templates, and their steps one by one for the step library. Once somebody has been here, what they took out stays out. */
async function addTemplates(em: EntityManager): Promise<void> {
  if ((await em.count(FlowTemplate)) + (await em.count(StepTemplate)) > 0) return;
  const library = await seedLibrary(em);
  const steps = new Map<string, StepValues>();
  for (const template of TEMPLATE_FLOWS) {
    const { name, note, diameter, incoming } = template;
    const typed = templateSteps(template, library);
    for (const step of typed) if (!steps.has(step.title)) steps.set(step.title, step);
    em.create(FlowTemplate, {
      ...delivered(),
      name,
      note,
      diameter,
      incomingThickness: measured(incoming * 1e-6, 20e-6, "assumed", "typical, check it"),
      steps: typed,
    });
  }
  for (const [name, step] of steps) em.create(StepTemplate, { ...delivered(), name, kind: step.kind, step });
  await em.flush();
}

function equipmentFrom(tool: ReferenceTool) {
  const practice = (value: number | null, unit: number) =>
    value === null ? null : measured(value * unit, null, "assumed", "common practice, no source");
  return {
    ...delivered(),
    name: tool.name,
    note: "",
    holding: tool.holding,
    atPeak: tool.atPeak,
    warpLimitEdgesUp: practice(tool.edgesUp, 1e-6),
    warpLimitEdgesDown: practice(tool.edgesDown, 1e-6),
    leastUnsupportedThickness: practice(tool.leastUnsupported, 1e-6),
    largestDiameter: measured(tool.largestDiameter * 1e-3, null, "assumed", "common practice, no source"),
    handling: { ...BLANK_TOOL_HANDLING, clamping: tool.clamping },
  };
}

import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { CarrierUnit } from "#app/db/entities/carrier-unit.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { Equipment } from "#app/db/entities/equipment.ts";
import { Film } from "#app/db/entities/film.ts";
import { Tape } from "#app/db/entities/tape.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { curveRangeWords } from "#app/lib/expansion-rows.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { sentenceCase } from "#app/lib/assessment-steps.ts";
import type { StepChoices } from "#app/lib/flow-step-choices.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";

const um = (value: number) => formatQuantity(value, "length", { unit: "µm" });
const mm = (value: number) => formatQuantity(value, "length", { unit: "mm" });
const celsius = (value: number) => formatQuantity(value, "temperature", { unit: "°C" });

const sentence = (parts: (string | null)[]) => `${parts.filter(Boolean).join("; ")}.`;

function toolWords(tool: Equipment): { short: string; words: string } {
  const { warpLimitEdgesUp: up, warpLimitEdgesDown: down, leastUnsupportedThickness: least } = tool;
  const warp =
    up && down
      ? `warp to ${um(up.value)} edges up, ${um(down.value)} edges down`
      : up || down
        ? `warp to ${up ? `${um(up.value)} edges up` : `${um(down?.value ?? 0)} edges down`}, the other way not given`
        : "no warp limit given";
  const limits = up && down ? ` (${um(up.value)} up, ${um(down.value)} down)` : "";
  return {
    short: `${tool.name}${limits}`,
    words: sentence([
      `Takes ${warp}`,
      `when hot the wafer is ${tool.atPeak}: ${tool.holding}`,
      least && least.value > 0 ? `bare silicon from ${um(least.value)}` : null,
      `wafers to ${mm(tool.largestDiameter.value)}`,
    ]).replace("Takes no", "No"),
  };
}

function carrierWords({ material, diameter, thickness, expansion, expansionCurve, temperatureLimit }: Carrier): string {
  const expands = expansion
    ? `expands ${formatMeasured(expansion, "expansion", { unit: "ppm/K" })}`
    : expansionCurve
      ? `expands by its curve, ${curveRangeWords(expansionCurve)}`
      : "expands as silicon does";
  return sentence([
    `${material === "glass" ? "Glass" : "Silicon"}, ${mm(diameter)}, ${um(thickness.value)}`,
    expands,
    `to ${celsius(temperatureLimit.value)}`,
  ]);
}

function materialWords(material: BondingMaterial): string {
  const { softening, flows, temperatureLimit, release, releaseTemperature, leastThickness, mostThickness } = material;
  const soft = softening
    ? `Softens at ${celsius(softening.value)} and ${flows ? "flows above it" : "does not flow"}`
    : "Does not soften";
  return sentence([
    soft,
    `takes ${celsius(temperatureLimit.value)}`,
    `bonds at ${celsius(material.bondTemperature.value)}`,
    `lets go by ${release} at ${celsius(releaseTemperature.value)}`,
    `${um(leastThickness)} to ${um(mostThickness)} thick`,
  ]);
}

function tapeWords({ kind, temperatureLimit, embeddingDepth, handling }: Tape): string {
  return sentence([
    kind === "grinding tape" ? "Grinding tape" : "Dicing tape",
    temperatureLimit ? `to ${celsius(temperatureLimit.value)}, ${temperatureLimit.source}` : null,
    embeddingDepth && embeddingDepth.value > 0 ? `takes up bumps in ${um(embeddingDepth.value)}` : null,
    handling.vacuum?.word === "resists" ? "goes into vacuum" : null,
    handling.releasesInLight ? "ultraviolet light lets it go" : null,
  ]);
}

/** Everything that a step's form offers, with what a person needs to know to choose. */
export async function stepChoices(scope: ActorScope): Promise<StepChoices> {
  requireOnSite(scope, "see the library");
  const byName = { orderBy: { name: "asc" as const } };
  const { films, tools, carriers, pieces, materials, tapes } = await inScope(scope, async (em) => ({
    films: await em.find(Film, {}, { ...byName, fields: ["name", "stress"] }),
    tools: await em.find(Equipment, {}, byName),
    carriers: await em.find(Carrier, {}, byName),
    pieces: await em.find(CarrierUnit, {}, { orderBy: { mark: "asc" }, populate: ["carrier"] }),
    materials: await em.find(BondingMaterial, {}, byName),
    tapes: await em.find(Tape, {}, byName),
  }));
  return {
    films: films.map(({ id, name, stress }) => ({
      id,
      name,
      words: `The film’s own: ${formatMeasured(stress, "stress", { unit: "MPa", sign: true })}, ${stress.source}.`,
    })),
    tools: tools.map((tool) => {
      const { short, words } = toolWords(tool);
      return { id: tool.id, name: short, words };
    }),
    carriers: carriers.map((carrier) => ({ id: carrier.id, name: carrier.name, words: carrierWords(carrier) })),
    pieces: pieces.map(({ id, mark, uses, state, carrier, thicknessVariation }) => ({
      id,
      mark,
      carrier: carrier.id,
      carrierName: carrier.name,
      words: sentence([
        sentenceCase(state),
        `used ${uses} of ${carrier.reuseLimit} times`,
        thicknessVariation ? `varies by ${um(thicknessVariation.value)}` : null,
      ]),
    })),
    materials: materials.map((material) => ({
      id: material.id,
      name: material.name,
      words: materialWords(material),
    })),
    tapes: tapes.map((tape) => ({ id: tape.id, name: tape.name, words: tapeWords(tape) })),
  };
}

/** The same for a step that is kept for every flow, which names no piece of a carrier. */
export async function libraryStepChoices(scope: ActorScope): Promise<StepChoices> {
  return { ...(await stepChoices(scope)), pieces: [] };
}

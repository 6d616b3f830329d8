import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import type { Measured } from "#app/engine/measured.ts";
import { cannotRelease, estimatePair, type PairInput } from "#app/lib/pair.ts";
import type { PairTrial, TriedPair } from "#app/lib/pair-trial.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { bondingMaterialInput, carrierInput } from "../flows/flow-inputs.ts";
import { readLimits } from "../limits.server.ts";

type Carrier = LibraryRecords["carrier"];

const SHOWN_CONTRIBUTIONS = 3;

/** A figure that nobody measured: typed into a trial, or the middle of a range. */
const assumed = (value: number): Measured => ({ value, tolerance: null, source: "assumed" });

/** The largest blank wafer that lies wholly on a carrier. */
async function largestWafer(em: EntityManager, { diameter }: Carrier): Promise<Silicon | undefined> {
  const [wafer] = await em.find(
    Silicon,
    { diameter: { $lte: diameter * (1 + 1e-9) }, orientation: "100" },
    { orderBy: { diameter: "desc", name: "asc" }, limit: 1 },
  );
  return wafer;
}

function siliconLeft(typed: string, wafer: Silicon): { measured: Measured | null } | { fault: string } {
  const read = readQuantity(typed, RULES.siliconThickness);
  if (!read.ok) return read.blank ? { measured: null } : { fault: read.message };
  if (read.value > wafer.thickness.value) return { fault: "That is more silicon than the wafer has." };
  return { measured: assumed(read.value) };
}

/**
 * A carrier tried on the largest blank wafer that it takes, with the bonding material and the remaining silicon that the address
 * asks for; without them, with the first material that can let go of it and the wafer as it is bought.
 */
export async function tryPair(scope: ActorScope, carrier: Carrier, search: URLSearchParams): Promise<PairTrial> {
  return inScope(scope, async (em) => {
    const materials = await em.find(BondingMaterial, {}, { orderBy: { name: "asc" } });
    const material =
      materials.find(({ id }) => id === search.get("material")) ??
      materials.find(({ release }) => cannotRelease(release, carrier) === null) ??
      materials[0];
    const typed = (search.get("silicon") ?? "").trim().slice(0, 60);
    const trial = {
      materials: materials.map(({ id, name }) => ({ id, name })),
      chosen: { material: material?.id ?? "", silicon: typed },
    };
    const wafer = await largestWafer(em, carrier);
    if (!material) return { ...trial, fault: null, pair: null };
    if (!wafer) return { ...trial, fault: "No silicon of the library is small enough for this carrier.", pair: null };
    const left = siliconLeft(typed, wafer);
    if ("fault" in left) return { ...trial, fault: left.fault, pair: null };
    const { name, diameter, orientation, thickness } = wafer;
    const input: PairInput = {
      wafer: { name, diameter, orientation, thickness },
      siliconLeft: left.measured,
      carrier: carrierInput(carrier),
      material: bondingMaterialInput(material),
      bondThickness: assumed((material.leastThickness + material.mostThickness) / 2),
    };
    try {
      const { budget, ...estimate } = estimatePair(input, await readLimits(em));
      const pair: TriedPair = {
        ...estimate,
        wafer: { name, diameter, thickness: thickness.value },
        siliconLeft: left.measured?.value ?? thickness.value,
        material: {
          name: material.name,
          effectiveModulus: material.effectiveModulus,
          bondTemperature: material.bondTemperature.value,
        },
        bondThickness: input.bondThickness.value,
        budget: budget.slice(0, SHOWN_CONTRIBUTIONS),
        cannotRelease: cannotRelease(material.release, carrier),
      };
      return { ...trial, fault: null, pair };
    } catch (error) {
      if (!(error instanceof EngineInputError)) throw error;
      return { ...trial, fault: `This pair cannot be computed: ${error.reason}.`, pair: null };
    }
  });
}

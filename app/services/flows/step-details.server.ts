import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { CarrierUnit } from "#app/db/entities/carrier-unit.ts";
import { Equipment } from "#app/db/entities/equipment.ts";
import { Film } from "#app/db/entities/film.ts";
import { Tape } from "#app/db/entities/tape.ts";
import { stressRecordOf } from "#app/lib/library-handling.ts";
import type { StepPlan } from "#app/schemas/flow-plan.ts";
import type { StepDetail, StepFilmDetail } from "#app/schemas/flow-view.ts";
import { bondingMaterialInput, carrierInput, equipmentInput, filmInput, pieceInput, tapeInput } from "./flow-inputs.ts";

interface Library {
  tools: Map<string, Equipment>;
  carriers: Map<string, Carrier>;
  pieces: Map<string, CarrierUnit>;
  materials: Map<string, BondingMaterial>;
  tapes: Map<string, Tape>;
  films: Map<string, Film>;
}

const present = (ids: (string | null)[]) => [...new Set(ids.filter((id) => id !== null))];
const byId = <Entity extends { id: string }>(entities: Entity[]) =>
  new Map(entities.map((entity) => [entity.id, entity]));

async function usedLibrary(em: EntityManager, steps: StepPlan[]): Promise<Library> {
  const named = (ids: (string | null)[]) => ({ id: { $in: present(ids) } });
  return {
    tools: byId(await em.find(Equipment, named(steps.map(({ equipment }) => equipment)))),
    carriers: byId(await em.find(Carrier, named(steps.map(({ carrier }) => carrier)))),
    pieces: byId(await em.find(CarrierUnit, named(steps.map(({ handling }) => handling.carrierPiece)))),
    materials: byId(await em.find(BondingMaterial, named(steps.map(({ bondingMaterial }) => bondingMaterial)))),
    tapes: byId(await em.find(Tape, named(steps.map(({ tape }) => tape)))),
    films: byId(await em.find(Film, named(steps.flatMap(({ films }) => films.map(({ film }) => film))))),
  };
}

/** Steps with all that they use read out of the library, in the order given. */
export async function stepDetails(em: EntityManager, steps: StepPlan[]): Promise<StepDetail[]> {
  const library = await usedLibrary(em, steps);
  return steps.map((step) => stepDetail(step, library));
}

/** The piece that a step names, as long as it is one of its carrier. */
function pieceOf({ carrier, handling }: StepPlan, pieces: Library["pieces"]): CarrierUnit | null {
  const piece = handling.carrierPiece === null ? undefined : pieces.get(handling.carrierPiece);
  return piece && piece.carrier.id === carrier ? piece : null;
}

function stepDetail(step: StepPlan, { tools, carriers, pieces, materials, tapes, films }: Library): StepDetail {
  const { equipment, carrier, bondingMaterial, tape, films: changes, ...typed } = step;
  const piece = pieceOf(step, pieces);
  const found = <Entity, Input>(id: string | null, map: Map<string, Entity>, toInput: (entity: Entity) => Input) => {
    const entity = id === null ? undefined : map.get(id);
    return entity ? toInput(entity) : null;
  };
  return {
    ...typed,
    equipment: found(equipment, tools, equipmentInput),
    carrier: found(carrier, carriers, (entity) => (piece ? pieceInput(entity, piece) : carrierInput(entity))),
    bondingMaterial: found(bondingMaterial, materials, bondingMaterialInput),
    tape: found(tape, tapes, tapeInput),
    films: changes.flatMap(({ film: id, stress, thickness, coverage, lines, ...change }): StepFilmDetail[] => {
      const film = films.get(id);
      if (!film) return [];
      return [
        {
          ...change,
          film: filmInput(film),
          thickness,
          ownStress: stress,
          stress: stress ?? film.stress,
          stressRecord: stress ? null : stressRecordOf(film),
          coverage: coverage ?? 1,
          lines: lines ?? null,
        },
      ];
    }),
  };
}

import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "../entities/bonding-material.ts";
import { Carrier } from "../entities/carrier.ts";
import { Equipment } from "../entities/equipment.ts";
import { Film } from "../entities/film.ts";
import { Silicon } from "../entities/silicon.ts";
import { Tape } from "../entities/tape.ts";

type Find<Entity> = (name: string) => Entity;

/** The library by name, as seeds refer to it. */
export interface SeedLibrary {
  film: Find<Film>;
  tool: Find<Equipment>;
  carrier: Find<Carrier>;
  material: Find<BondingMaterial>;
  tape: Find<Tape>;
  silicon: Find<Silicon>;
}

function byName<Entity extends { name: string }>(what: string, entities: Entity[]): Find<Entity> {
  const known = new Map(entities.map((entity) => [entity.name, entity]));
  return (name) => {
    const entity = known.get(name);
    if (!entity) throw new Error(`A seed names a ${what} that is not in the library: ${name}`);
    return entity;
  };
}

export async function seedLibrary(em: EntityManager): Promise<SeedLibrary> {
  return {
    film: byName("film", await em.findAll(Film)),
    tool: byName("tool", await em.findAll(Equipment)),
    carrier: byName("carrier", await em.findAll(Carrier)),
    material: byName("bonding material", await em.findAll(BondingMaterial)),
    tape: byName("tape", await em.findAll(Tape)),
    silicon: byName("silicon wafer", await em.findAll(Silicon)),
  };
}

import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { Equipment } from "#app/db/entities/equipment.ts";
import type { StepKind } from "#app/engine/flow/model.ts";
import type { Catalogue } from "#app/engine/trial/catalogue.ts";
import { bondingMaterialInput, carrierInput, equipmentInput } from "../flows/flow-inputs.ts";

/**
 * What the site has to choose from. What a tool is used for nobody states: it is read off the flows that the person may see, so no
 * grinder is offered for a sputterer.
 */
export async function readCatalogue(em: EntityManager): Promise<Catalogue> {
  const byName = { orderBy: { name: "asc" as const } };
  const carriers = await em.find(Carrier, {}, byName);
  const materials = await em.find(BondingMaterial, {}, byName);
  const tools = await em.find(Equipment, {}, byName);
  const uses = await em.execute<{ equipment_id: string; kind: StepKind }[]>(
    "select distinct equipment_id, kind from flow_step where equipment_id is not null order by kind",
  );
  return {
    carriers: carriers.map(carrierInput),
    materials: materials.map((material) => ({
      material: bondingMaterialInput(material),
      leastThickness: material.leastThickness,
      mostThickness: material.mostThickness,
    })),
    tools: tools.map((tool) => ({
      tool: equipmentInput(tool),
      kinds: uses.flatMap((use) => (use.equipment_id === tool.id ? [use.kind] : [])),
    })),
  };
}

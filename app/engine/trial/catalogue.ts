import type { BondingMaterialInput, CarrierInput, EquipmentInput, StepKind } from "../flow/model.ts";

/** A bonding material with the thicknesses that it is put on in, m. */
export interface CatalogueMaterial {
  material: BondingMaterialInput;
  leastThickness: number;
  mostThickness: number;
}

/** A tool with the kinds of step that it is used for: a grinder is no answer to a sputterer's limit. */
export interface CatalogueTool {
  tool: EquipmentInput;
  kinds: StepKind[];
}

/** What a flow can be tried with instead. */
export interface Catalogue {
  carriers: CarrierInput[];
  materials: CatalogueMaterial[];
  tools: CatalogueTool[];
}

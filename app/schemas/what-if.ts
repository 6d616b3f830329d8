import type { BondingMaterialInput, CarrierInput, FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";

export const TYPED_FIELDS = ["siliconAfter", "peakTemperature", "filmThickness", "filmStress"] as const;
export const CHOSEN_FIELDS = ["planned", "carrier", "bondingMaterial"] as const;
export type TypedField = (typeof TYPED_FIELDS)[number];
export type ChosenField = (typeof CHOSEN_FIELDS)[number];

/** One quantity of one step, tried at another value: SI for what is typed, a word or an id for what is chosen. */
export type WhatIfChange = { step: string; film: number | null } & (
  { field: TypedField; value: number } | { field: ChosenField; value: string }
);

/** A flow as the server would assess it, with what can be chosen instead. */
export interface WhatIfSnapshot {
  version: number;
  input: FlowInput;
  limits: SiteLimits;
  /** ids of the steps, in their order */
  stepIds: string[];
  carriers: CarrierInput[];
  materials: BondingMaterialInput[];
}

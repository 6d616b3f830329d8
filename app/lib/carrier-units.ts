import type { ListPage } from "./list-params.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";

/** What a piece is doing. Only a scrapped one is never bonded again. */
export const CARRIER_UNIT_STATES = ["in use", "cleaned", "scrapped"] as const;
export type CarrierUnitState = (typeof CARRIER_UNIT_STATES)[number];

/** A piece of a kind of carrier as its list shows it. */
export interface CarrierUnitRow {
  id: string;
  mark: string;
  uses: number;
  state: CarrierUnitState;
  /** ISO date */
  lastUsedOn: string | null;
  stamp: RecordStamp;
}

/** The pieces of a kind of carrier. */
export interface CarrierUnits {
  page: ListPage<CarrierUnitRow>;
  /** how many there are, whatever was searched */
  all: number;
}

/** How many more times a piece may be used, in words. */
export function usesLeft({ uses, state }: Pick<CarrierUnitRow, "uses" | "state">, limit: number): string {
  if (state === "scrapped") return "scrapped";
  const left = limit - uses;
  if (left < 0) return `${-left} beyond its limit`;
  return left === 0 ? "none left" : `${left} left`;
}

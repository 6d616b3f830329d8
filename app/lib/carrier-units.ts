import type { SubmissionResult } from "@conform-to/react";
import type { Measured } from "#app/engine/measured.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import type { ListPage } from "./list-params.ts";

/** What a piece is doing. Only a scrapped one is never bonded again. */
export const CARRIER_UNIT_STATES = ["in use", "cleaned", "scrapped"] as const;
export type CarrierUnitState = (typeof CARRIER_UNIT_STATES)[number];

/** What can be done to a piece, in which states, and the state that it leads to. */
export const UNIT_CHANGES = {
  use: { label: "Count a use", busy: "Counting", from: ["in use", "cleaned"], to: "in use" },
  clean: { label: "Cleaned", busy: "Saving", from: ["in use"], to: "cleaned" },
  restore: { label: "Take back", busy: "Saving", from: ["scrapped"], to: "cleaned" },
  scrap: { label: "Scrap", busy: "Scrapping", from: ["in use", "cleaned"], to: "scrapped" },
} as const satisfies Record<
  string,
  { label: string; busy: string; from: readonly CarrierUnitState[]; to: CarrierUnitState }
>;
export type UnitChange = keyof typeof UNIT_CHANGES;

/** A piece of a kind of carrier as its list shows it. */
export interface CarrierUnitRow {
  id: string;
  mark: string;
  uses: number;
  state: CarrierUnitState;
  /** ISO date */
  lastUsedOn: string | null;
  /** measured on it; null until it is */
  thicknessVariation: Measured | null;
  stamp: RecordStamp;
}

/** The pieces of a kind of carrier. */
export interface CarrierUnits {
  page: ListPage<CarrierUnitRow>;
  /** how many there are, whatever was searched */
  all: number;
}

/** What the page of a carrier is told when a change of its pieces did not go through. */
export interface UnitAnswer {
  /** of the form that adds a piece */
  lastResult: SubmissionResult<string[]> | null;
  /** of a change to a piece: why it was not made */
  refused: string | null;
}

/** How many more times a piece may be used, in words. */
export function usesLeft({ uses, state }: Pick<CarrierUnitRow, "uses" | "state">, limit: number): string {
  if (state === "scrapped") return "none, scrapped";
  const left = limit - uses;
  if (left < 0) return `${-left} beyond its limit`;
  return left === 0 ? "none left" : `${left} left`;
}

/** A carrier by its name, with the mark of the piece where one is named. */
export function withPieceMark(carrier: string, mark: string | null | undefined): string {
  return mark ? `${carrier}, piece ${mark}` : carrier;
}

import type { UnitSymbol } from "../../working.ts";
import type { ScanChecks } from "./scan-checks.ts";

/** What a check says: the mistake was made, it was not, or what it would need is not there or does not tell. */
export type MistakeState = "seen" | "not seen" | "cannot tell";

export interface MistakeFinding {
  /** of the check, from 1 */
  number: number;
  name: string;
  state: MistakeState;
  /** what the check read, in words */
  read: string;
  /** the number that decided, in SI; null when there was none */
  figure: { label: string; value: number; unit: UnitSymbol } | null;
  /** one sentence in plain words */
  sentence: string;
  /** what to do; null unless it was seen */
  remedy: string | null;
}

/** What a check finds, before its number and name are put to it. */
export type Found = Omit<MistakeFinding, "number" | "name" | "remedy">;

/** A check for one mistake: a pure function of the data and of what was expected. */
export interface Mistake {
  number: number;
  name: string;
  /** what it asks, for the method page */
  asks: string;
  remedy: string;
  /** share of honest scans on which it may say 'seen' */
  falseAlarms: number;
  judge(checks: ScanChecks): Found;
}

/** Short forms of the three answers. */
export const seen = (read: string, sentence: string, figure: Found["figure"] = null): Found => ({
  state: "seen",
  read,
  sentence,
  figure,
});
export const notSeen = (read: string, sentence: string, figure: Found["figure"] = null): Found => ({
  state: "not seen",
  read,
  sentence,
  figure,
});
export const cannotTell = (read: string, sentence: string, figure: Found["figure"] = null): Found => ({
  state: "cannot tell",
  read,
  sentence,
  figure,
});

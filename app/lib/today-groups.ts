import type { TodayFlow, TodayGroup, TodayLots } from "#app/schemas/today.ts";
import { count } from "./count-words.ts";

/** Rows that a group shows; the rest is counted and one link away. */
export const SHOWN = 6;

type Assessed = TodayFlow & { newest: NonNullable<TodayFlow["newest"]> };

export interface TodayGroups {
  decisions: TodayGroup<Assessed>;
  outOfDate: TodayGroup<Assessed>;
  notAssessed: TodayGroup<TodayFlow>;
}

/**
 * Parts flows by what they wait for, each group oldest first: not assessed yet; changed since the newest assessment, which then
 * decides nothing any more; assessed and not clear. What is clear waits for nothing.
 * @param outOfDate ids of the assessments that rest on inputs that have changed since
 */
export function groupFlows(flows: readonly TodayFlow[], outOfDate: ReadonlySet<string>): TodayGroups {
  const assessed = flows.filter((flow): flow is Assessed => flow.newest !== null);
  const stale = assessed.filter(({ newest }) => outOfDate.has(newest.id));
  const current = assessed.filter(({ newest }) => !outOfDate.has(newest.id));
  return {
    decisions: group(
      current.filter(({ newest }) => newest.outcome !== "clear"),
      ({ newest }) => newest.at,
    ),
    outOfDate: group(stale, ({ updatedAt }) => updatedAt),
    notAssessed: group(
      flows.filter(({ newest }) => newest === null),
      ({ updatedAt }) => updatedAt,
    ),
  };
}

function group<Row>(rows: Row[], since: (row: Row) => string): TodayGroup<Row> {
  const sorted = rows.toSorted((a, b) => since(a).localeCompare(since(b)));
  return { rows: sorted.slice(0, SHOWN), total: rows.length };
}

interface Waiting extends Record<keyof TodayGroups, { total: number }> {
  sheets: Record<"toRelease" | "toSign" | "returned", { total: number }>;
  lots: Record<keyof TodayLots, { total: number }>;
  incidents: { total: number };
}

/** What waits, in one sentence, what waits for the reader alone first: 'One sheet waits for your review and two flows need a decision.' */
export function headline({ sheets, lots, incidents, decisions, outOfDate, notAssessed }: Waiting): string {
  const { toRelease, toSign, returned } = sheets;
  const parts = [
    part(toRelease.total, "sheet waits for your review", "sheets wait for your review"),
    part(toSign.total, "deviation waits for your signature", "deviations wait for your signature"),
    part(returned.total, "sheet was returned to you", "sheets were returned to you"),
    part(lots.blocked.total, "lot or step is held", "lots or steps are held"),
    part(lots.toTake.total, "place is to be taken over", "places are to be taken over"),
    part(lots.toMove.total, "lot is on an old sheet", "lots are on old sheets"),
    part(incidents.total, "incident is to be followed up", "incidents are to be followed up"),
    part(decisions.total, "flow needs a decision", "flows need a decision"),
    part(outOfDate.total, "assessment is out of date", "assessments are out of date"),
    part(notAssessed.total, "flow is not assessed yet", "flows are not assessed yet"),
  ].filter((text) => text !== null);
  const [last] = parts.slice(-1);
  if (last === undefined) return "Nothing waits for a decision.";
  return sentenceOf(parts.length === 1 ? last : `${parts.slice(0, -1).join(", ")} and ${last}`);
}

/** What a guest has, in one sentence: 'Two sheets are in force for your programs.' */
export const headlineForGuest = (inForce: number): string =>
  sentenceOf(`${part(inForce, "sheet is", "sheets are") ?? "no sheet is"} in force for your programs`);

const sentenceOf = (words: string) => `${words.charAt(0).toUpperCase()}${words.slice(1)}.`;

const part = (number: number, one: string, many: string) =>
  number === 0 ? null : `${count(number)} ${number === 1 ? one : many}`;

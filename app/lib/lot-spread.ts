import { formatQuantity } from "#app/engine/units/format.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { LotRecord, WaferAnswer } from "#app/schemas/lot.ts";
import { micrometres } from "./assessment-figure.ts";

/** A wafer of a lot as a table shows it. */
export interface SpreadRow {
  slot: number;
  bow: string;
  thickness: string;
  /** 'step 12, Grind'; null where nothing could be computed */
  step: string | null;
  /** 'edges up 231 µm', 'rolls up, edges lift 12 mm' */
  lies: string;
  limit: string;
  /** warp over what the tool takes; null without a limit */
  share: number | null;
  shareText: string;
  outcome: Outcome;
  reason: string | null;
}

const MISSING = "–";

/** One place below the point in every row, so that a column can be read down. */
const tenths = (value: number) => formatQuantity(value, "length", { unit: "µm", decimals: 1 });

/** The wafers of a lot in the order of their slots. */
export function spreadRows({ answers, thickness }: Pick<LotRecord, "answers" | "thickness">): SpreadRow[] {
  return answers.map((answer) => spreadRow(answer, thickness));
}

function spreadRow({ slot, bow, thickness, at, outcome, reason }: WaferAnswer, mean: number | null): SpreadRow {
  const thick = thickness ?? mean;
  const share = at && at.limit !== null ? at.warp / at.limit : null;
  return {
    slot,
    bow: tenths(bow),
    thickness: thick === null ? "as assessed" : tenths(thick),
    step: at && `${at.step}, ${at.title}`,
    lies:
      at === null
        ? MISSING
        : at.rolled
          ? `rolls up, edges lift ${micrometres(at.warp)}`
          : `${at.lies} ${micrometres(at.warp)}`,
    limit: at === null || at.limit === null ? MISSING : micrometres(at.limit),
    share,
    shareText: share === null ? MISSING : `${Math.round(100 * share)}\u00A0%`,
    outcome,
    reason,
  };
}

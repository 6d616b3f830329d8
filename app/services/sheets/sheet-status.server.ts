import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import type { SheetStatus } from "#app/schemas/sheet-view.ts";
import { inScope } from "#app/server/scope.server.ts";

interface Row {
  slug: string;
  sheet_number: number;
  number: number;
  state: SheetStatus["state"];
  decided_at: Date | string;
  ended_at: Date | string | null;
  superseded_by: number | null;
  next_token: string | null;
  deviation_until: Date | string | null;
}

/** How the paper with this code stands, for whoever holds it, signed in or not; null for a code that was never given out. */
export async function sheetStatus(token: string, requestId: string): Promise<SheetStatus | null> {
  if (!/^[\w-]{22}$/.test(token)) return null;
  const [row] = await inScope({ personId: null, requestId }, (em) =>
    em.execute<Row[]>("select * from sheet_status(?)", [token]),
  );
  if (!row) return null;
  return {
    sheet: recordNumber("sheet", row.slug, row.sheet_number),
    letter: revisionLetters(row.number),
    state: row.state,
    releasedAt: new Date(row.decided_at).toISOString(),
    endedAt: row.ended_at === null ? null : new Date(row.ended_at).toISOString(),
    supersededBy: row.superseded_by === null ? null : revisionLetters(row.superseded_by),
    current: row.next_token === token ? null : row.next_token,
    deviationUntil: row.deviation_until === null ? null : new Date(row.deviation_until).toISOString(),
  };
}

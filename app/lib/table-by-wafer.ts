import type { ReadContent } from "#app/schemas/scan-reading.ts";
import type { WaferMeasurementContent } from "#app/schemas/wafer.ts";

/** A wafer as a table or a person names it; nothing where it is not named. */
export interface TableWafer {
  lot: string;
  wafer: string;
  slot: number | null;
}

export interface NamedContent {
  named: TableWafer;
  content: WaferMeasurementContent;
}

interface Row {
  lot?: string | null;
  slot?: number | null;
  wafer: string | null;
}

/**
 * What a table says of each wafer. Rows that name neither wafer nor slot are of the wafer that `otherwise` names; rows without a lot
 * are of its lot.
 */
export function contentByWafer(content: ReadContent, otherwise: TableWafer): NamedContent[] {
  switch (content.kind) {
    case "profiles":
      return [];
    case "summary":
      // A wafer that is listed twice counts as its first row says; the reader has noted the second as a fault.
      return grouped(content.wafers, otherwise).map(({ named, rows: [first] }) => ({
        named,
        content: {
          kind: "summary",
          figures: content.figures.map((figure, n) => ({ ...figure, value: first?.values[n] ?? null })),
          measured: content.measured,
        },
      }));
    case "thickness map":
      return grouped(content.sites, otherwise).map(({ named, rows }) => ({
        named,
        content: {
          kind: "thickness map",
          sites: rows.map(({ wafer: _wafer, ...site }) => site),
          underneath: content.underneath,
        },
      }));
    case "reduced stress":
      return grouped(content.wafers, otherwise).map(({ named, rows }) => ({
        named,
        content: {
          kind: "reduced stress",
          stresses: rows.map(({ lot: _lot, slot: _slot, wafer: _wafer, ...stress }) => stress),
        },
      }));
  }
}

function grouped<R extends Row>(rows: readonly R[], otherwise: TableWafer): { named: TableWafer; rows: R[] }[] {
  const groups = new Map<string, { named: TableWafer; rows: R[] }>();
  for (const row of rows) {
    const named = nameOf(row, otherwise);
    const key = JSON.stringify([named.lot.toLowerCase(), named.wafer.toLowerCase(), named.slot]);
    const group = groups.get(key);
    if (group) group.rows.push(row);
    else groups.set(key, { named, rows: [row] });
  }
  return [...groups.values()];
}

function nameOf({ lot, slot = null, wafer }: Row, otherwise: TableWafer): TableWafer {
  const ofLot = lot?.trim() || otherwise.lot;
  const name = (wafer ?? "").trim();
  return name === "" && slot === null ? { ...otherwise, lot: ofLot } : { lot: ofLot, wafer: name, slot };
}

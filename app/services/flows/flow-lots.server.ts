import type { EntityManager } from "@mikro-orm/postgresql";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { lotCounts } from "#app/lib/lot-words.ts";
import type { FlowLotRow, LotRecord } from "#app/schemas/lot.ts";

interface Row {
  id: string;
  number: number;
  outcome: Outcome;
  lot: LotRecord;
  created_at: Date | string;
  person: string;
}

const SHOWN = 50;

/** The kept lots of a flow, newest first. Whether the person may see them is the caller's. */
export async function flowLots(em: EntityManager, flowId: string): Promise<FlowLotRow[]> {
  const rows = await em.execute<Row[]>(
    `select a.id, a.number, a.outcome, a.lot, a.created_at, p.name as person
       from assessment a join person p on p.id = a.created_by_id
      where a.flow_id = ? and a.lot is not null order by a.lot_number desc limit ${SHOWN}`,
    [flowId],
  );
  return rows.map(({ id, number, outcome, lot, created_at, person }) => {
    const { wafers, missed } = lotCounts(lot.answers);
    return {
      id,
      number,
      outcome,
      name: lot.name,
      bow: lot.bow,
      wafers,
      missed,
      createdAt: new Date(created_at).toISOString(),
      createdBy: person,
    };
  });
}

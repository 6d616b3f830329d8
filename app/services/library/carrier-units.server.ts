import { raw, type EntityManager } from "@mikro-orm/postgresql";
import { Carrier } from "#app/db/entities/carrier.ts";
import { CarrierUnit } from "#app/db/entities/carrier-unit.ts";
import {
  CARRIER_UNIT_STATES,
  UNIT_CHANGES,
  type CarrierUnitRow,
  type CarrierUnits,
  type CarrierUnitState,
  type UnitChange,
} from "#app/lib/carrier-units.ts";
import { PAGE_SIZE, readListParams } from "#app/lib/list-params.ts";
import type { CarrierUnitValues } from "#app/schemas/carrier-unit.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { conflictOf, newRecord, saving, stampOf, touch, type Saved } from "../record.server.ts";
import { LIBRARY } from "./kinds.server.ts";

/** Names used in the address, with the SQL that they sort by; the first is the default. */
const SORTS: Record<string, string> = {
  mark: "lower(mark)",
  uses: "uses",
  state: "state",
  used: "last_used_on",
};

function rowOf(unit: CarrierUnit): CarrierUnitRow {
  const { id, mark, uses, state } = unit;
  return {
    id,
    mark,
    uses,
    state,
    lastUsedOn: unit.lastUsedOn ?? null,
    thicknessVariation: unit.thicknessVariation ?? null,
    stamp: stampOf(unit),
  };
}

/** The pieces of a kind of carrier that an address asks for: searched by mark, filtered by state, sorted and paged. */
export async function listCarrierUnits(
  scope: ActorScope,
  carrierId: string,
  search: URLSearchParams,
): Promise<CarrierUnits> {
  requireOnSite(scope, "see the library");
  const params = readListParams(search, { sorts: Object.keys(SORTS), filters: ["state"] });
  const state = CARRIER_UNIT_STATES.find((known) => known === params.filters["state"]);
  return inScope(scope, async (em) => {
    const all = await em.count(CarrierUnit, { carrier: carrierId });
    const [units, total] = await em.findAndCount(
      CarrierUnit,
      {
        carrier: carrierId,
        ...(params.query ? { mark: { $ilike: `%${escapeLike(params.query)}%` } } : {}),
        ...(state ? { state } : {}),
      },
      {
        populate: ["updatedBy"],
        orderBy: [
          { [raw(SORTS[params.sort] ?? "lower(mark)")]: params.descending ? "desc nulls last" : "asc nulls last" },
          { id: "asc" },
        ],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    return { page: { rows: units.map(rowOf), total, params }, all };
  });
}

/**
 * Adds a piece to a kind of carrier. Marks are told apart within their kind.
 * @throws 403 for a role that may not, 404 when there is no such carrier
 */
export async function addCarrierUnit(
  scope: ActorScope,
  carrierId: string,
  { mark, uses }: CarrierUnitValues,
): Promise<Saved> {
  requireOnSite(scope, LIBRARY.carrier.edit);
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const carrier = await em.findOne(Carrier, { id: carrierId });
      if (!carrier) throw notFound("carrier");
      if (await em.findOne(CarrierUnit, { carrier, mark })) return { outcome: "name taken" };
      const unit = em.create(CarrierUnit, {
        ...newRecord(scope),
        carrier,
        mark,
        uses,
        state: uses === 0 ? "cleaned" : "in use",
        lastUsedOn: null,
        thicknessVariation: null,
      });
      await em.flush();
      return { outcome: "saved", id: unit.id };
    }),
  );
}

/** What became of a piece; `not possible` when its state does not allow the change. */
export type UnitChanged = Saved | { outcome: "not possible"; mark: string };

/**
 * Counts a use of a piece, says that it is clean again, or scraps it. A version that is no longer current is a conflict: two
 * people who count the same use at once would otherwise count it twice.
 * @throws 403 for a role that may not, 404 when there is no such piece of this carrier
 */
export async function changeCarrierUnit(
  scope: ActorScope,
  carrierId: string,
  { id, version, change }: { id: string; version: number | null; change: UnitChange },
): Promise<UnitChanged> {
  requireOnSite(scope, LIBRARY.carrier.edit);
  let impossible: UnitChanged | null = null;
  const saved = await saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const unit = await findUnit(em, carrierId, id);
      const conflict = conflictOf({ ...unit, name: unit.mark }, version);
      if (conflict) return { outcome: "conflict", conflict };
      const from: readonly CarrierUnitState[] = UNIT_CHANGES[change].from;
      if (!from.includes(unit.state)) {
        impossible = { outcome: "not possible", mark: unit.mark };
        return { outcome: "saved", id };
      }
      unit.state = UNIT_CHANGES[change].to;
      if (change === "use") {
        unit.uses += 1;
        unit.lastUsedOn = new Date().toISOString().slice(0, 10);
      }
      touch(unit, scope);
      await em.flush();
      return { outcome: "saved", id };
    }),
  );
  return impossible ?? saved;
}

/**
 * Keeps the thickness variation (m) that was measured on a piece today; null takes it away, and that of its kind counts again.
 * @throws 403 for a role that may not, 404 when there is no such piece of this carrier
 */
export async function measureCarrierUnit(
  scope: ActorScope,
  carrierId: string,
  { id, version, variation }: { id: string; version: number | null; variation: number | null },
): Promise<UnitChanged> {
  requireOnSite(scope, LIBRARY.carrier.edit);
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const unit = await findUnit(em, carrierId, id);
      const conflict = conflictOf({ ...unit, name: unit.mark }, version);
      if (conflict) return { outcome: "conflict", conflict };
      const on = new Date().toISOString().slice(0, 10);
      unit.thicknessVariation =
        variation === null ? null : { value: variation, tolerance: null, source: "measured here", note: "", on };
      touch(unit, scope);
      await em.flush();
      return { outcome: "saved", id };
    }),
  );
}

async function findUnit(em: EntityManager, carrierId: string, id: string): Promise<CarrierUnit> {
  const unit = await em.findOne(CarrierUnit, { id, carrier: carrierId }, { populate: ["updatedBy"] });
  if (!unit) throw notFound("piece");
  return unit;
}

import { LockMode } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import { SiteLimit } from "#app/db/entities/site-limit.ts";
import {
  defaultLimits,
  LIMIT_DEFINITIONS,
  type LimitDefinition,
  type LimitKey,
  type SiteLimits,
} from "#app/engine/rules/limits.ts";
import { RULES } from "#app/engine/rules/rules.ts";
import { limitQuantity, limitText } from "#app/lib/limit-quantity.ts";
import type { LimitGroup, LimitRow } from "#app/lib/limit-rows.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import { contradictions, type LimitChange } from "#app/schemas/site-limit.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "./permission.server.ts";
import { newRecord, touch } from "./record.server.ts";

const EDIT = "edit carriers, bonds and limits";
const definitions: Record<LimitKey, LimitDefinition> = LIMIT_DEFINITIONS;
const KEYS = Object.keys(definitions) as LimitKey[];

/** The site's limits within a transaction that is already open. */
export async function readLimits(em: EntityManager): Promise<SiteLimits> {
  const limits = defaultLimits();
  for (const { key, value, source } of await em.findAll(SiteLimit)) if (key in limits) limits[key] = { value, source };
  return limits;
}

/** The site's limits; a guest, who may not see them, gets the delivered ones. */
export async function siteLimits(scope: ActorScope): Promise<SiteLimits> {
  return inScope(scope, readLimits);
}

/** The limits that a rule judges by, in the order of their definition. */
export function limitsOfRule(rule: number): LimitKey[] {
  return KEYS.filter((key) => definitions[key].rule === rule);
}

function rowOf(key: LimitKey, record: SiteLimit | undefined): LimitRow {
  const definition = definitions[key];
  const { title, value, source } = definition;
  return {
    key,
    title,
    ...limitQuantity(definition),
    value: record?.value ?? value,
    source: record?.source ?? source,
    delivered: { value, source },
    version: record?.version ?? 0,
    updatedAt: record?.updatedBy ? record.updatedAt.toISOString() : null,
    updatedBy: record?.updatedBy?.name ?? null,
  };
}

/** Every limit that the rules judge by, rule by rule, beside what was delivered. */
export async function listLimits(scope: ActorScope): Promise<{ groups: LimitGroup[]; mayEdit: boolean }> {
  requireOnSite(scope, "see the library");
  return inScope(scope, async (em) => {
    const records = await em.findAll(SiteLimit, { populate: ["updatedBy"] });
    const rules = [...new Set(KEYS.map((key) => definitions[key].rule))].toSorted((a, b) => a - b);
    const groups = rules.map((rule) => ({
      rule,
      title: RULES.find(({ number }) => number === rule)?.title ?? null,
      limits: limitsOfRule(rule).map((key) =>
        rowOf(
          key,
          records.find((record) => record.key === key),
        ),
      ),
    }));
    return { groups, mayEdit: mayOnSite(scope.actor, EDIT) };
  });
}

/** Outcome of saving limits; `opened` is what stands now, to send along when the person decides to save over it. */
export type LimitsSaved =
  | { outcome: "saved" }
  | {
      outcome: "refused";
      errors: Record<string, string[]>;
      opened: Partial<Record<LimitKey, LimitChange["opened"]>>;
    };

const same = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));

/** What the person changed of what they saw. */
const isTouched = ({ value, source, opened }: LimitChange) => !same(value, opened.value) || source !== opened.source;

/**
 * Saves the limits that the person changed, all of them or none. Refused when somebody else has changed one of those since, or
 * when two limits would contradict each other as they would then stand.
 */
export async function saveLimits(
  scope: ActorScope,
  changes: Partial<Record<LimitKey, LimitChange>>,
): Promise<LimitsSaved> {
  requireOnSite(scope, EDIT);
  const touched = (Object.entries(changes) as [LimitKey, LimitChange][]).filter(([, change]) => isTouched(change));
  return inScope(scope, async (em): Promise<LimitsSaved> => {
    // One at a time: two people who change one limit each could otherwise bring about a contradiction together.
    const records = await em.findAll(SiteLimit, {
      orderBy: { key: "asc" },
      lockMode: LockMode.PESSIMISTIC_WRITE,
    });
    await em.populate(records, ["updatedBy"]);
    const recordOf = (key: LimitKey) => records.find((record) => record.key === key);
    const refused = refusals(recordOf, touched);
    if (Object.keys(refused.errors).length > 0) return { outcome: "refused", ...refused };
    for (const [key, { value, source }] of touched) {
      const record = recordOf(key);
      if (!record) em.create(SiteLimit, { ...newRecord(scope), key, value, source });
      else {
        em.assign(record, { value, source });
        touch(record, scope);
      }
    }
    await em.flush();
    return { outcome: "saved" };
  });
}

function refusals(recordOf: (key: LimitKey) => SiteLimit | undefined, touched: [LimitKey, LimitChange][]) {
  const errors: Record<string, string[]> = {};
  const opened: Partial<Record<LimitKey, LimitChange["opened"]>> = {};
  const text = (key: LimitKey, value: number) => limitText(value, limitQuantity(definitions[key]));
  const values = Object.fromEntries(KEYS.map((key) => [key, rowOf(key, recordOf(key)).value])) as Record<
    LimitKey,
    number
  >;
  for (const [key, change] of touched) {
    values[key] = change.value;
    const { version, value, source, updatedBy, updatedAt } = rowOf(key, recordOf(key));
    if (change.opened.version === version || (same(change.value, value) && change.source === source)) continue;
    const at = updatedAt ? ` at ${updatedAt.slice(0, 16).replace("T", " ")} UTC` : "";
    errors[`${key}.value`] = [
      `${updatedBy ?? "Somebody"} set this to ${text(key, value)}${at}, after you had opened it. Save again to put yours in its place.`,
    ];
    opened[key] = { version, value, source };
  }
  const isNew = (limit: LimitKey) => touched.some(([key]) => key === limit);
  for (const { more, less } of contradictions(values)) {
    // What contradicted itself before is not this person's doing.
    if (!isNew(more) && !isNew(less)) continue;
    const [at, other, than, must] = isNew(more)
      ? ([more, less, "less", "least"] as const)
      : ([less, more, "more", "most"] as const);
    (errors[`${at}.value`] ??= []).push(
      `${text(at, values[at])} is ${than} than “${definitions[other].title}”, ${text(other, values[other])}: it must be at ${must} that.`,
    );
  }
  return { errors, opened };
}

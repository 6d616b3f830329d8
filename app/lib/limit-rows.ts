import type { LimitKey } from "#app/engine/rules/limits.ts";
import type { LimitQuantity } from "./limit-quantity.ts";

/** A limit as its page shows it. Value in SI. */
export interface LimitRow extends LimitQuantity {
  key: LimitKey;
  title: string;
  value: number;
  source: string;
  delivered: { value: number; source: string };
  /** 0 while the site has no record of it: then it is as delivered */
  version: number;
  updatedAt: string | null;
  updatedBy: string | null;
}

/** The limits that one rule judges by. */
export interface LimitGroup {
  rule: number;
  /** null for a rule that this version does not judge yet */
  title: string | null;
  limits: LimitRow[];
}

/** Whether the site has set a value of its own. */
export function isChanged({ value, delivered }: Pick<LimitRow, "value" | "delivered">): boolean {
  return Math.abs(value - delivered.value) > 1e-9 * Math.abs(delivered.value);
}

/** The limits that a reader's words are in, each with its rule; every word must be found in its title, its source or its rule's. */
export function searchLimits(groups: LimitGroup[], query: string): LimitGroup[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  const fits = (group: LimitGroup) => (limit: LimitRow) => {
    const text = `rule ${group.rule} ${group.title ?? ""} ${limit.title} ${limit.source}`.toLowerCase();
    return words.every((word) => text.includes(word));
  };
  return groups
    .map((group) => ({ ...group, limits: group.limits.filter(fits(group)) }))
    .filter(({ limits }) => limits.length > 0);
}

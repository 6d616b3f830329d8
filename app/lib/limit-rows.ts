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

/** 'rule 6' in a search means that rule and no other. */
const RULE = /\brule\s+(\d+)\b/;

/**
 * The limits that a reader asks for: every word must be found in a limit's title, its source or its rule's title; 'rule 6' names
 * a rule.
 */
export function searchLimits(groups: LimitGroup[], query: string): LimitGroup[] {
  const asked = query.toLowerCase();
  const rule = RULE.exec(asked)?.[1];
  const words = asked.replace(RULE, " ").split(/\s+/).filter(Boolean);
  const fits = (group: LimitGroup) => (limit: LimitRow) => {
    const text = `${group.title ?? ""} ${limit.title} ${limit.source}`.toLowerCase();
    return words.every((word) => text.includes(word));
  };
  return groups
    .filter((group) => rule === undefined || group.rule === Number(rule))
    .map((group) => ({ ...group, limits: group.limits.filter(fits(group)) }))
    .filter(({ limits }) => limits.length > 0);
}

import { DESCRIBED_RULES } from "#app/engine/rules/described-rules.ts";
import { LIMIT_DEFINITIONS, type LimitDefinition, type LimitKey } from "#app/engine/rules/limits.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { limitQuantity } from "#app/lib/limit-quantity.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import type { RuleText } from "#app/schemas/rule-text.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { siteLimits } from "./limits.server.ts";

/** The handling rules in words; with the site's limits for those who may see the library. */
export async function ruleTexts(scope: ActorScope): Promise<RuleText[]> {
  const limits = mayOnSite(scope.actor, "see the library") ? await siteLimits(scope) : null;
  return DESCRIBED_RULES.map(({ number, title, asks, limits: keys }) => ({
    number,
    title,
    asks,
    limits: limits && keys.map((key) => limitText(key, limits[key])),
  }));
}

function limitText(key: LimitKey, { value, source }: { value: number; source: string }) {
  const definition: LimitDefinition = LIMIT_DEFINITIONS[key];
  const delivered = definition.value === value ? null : limitValue(definition.value, definition);
  return { title: definition.title, value: limitValue(value, definition), delivered, source };
}

function limitValue(value: number, definition: LimitDefinition): string {
  const { dimension, unit } = limitQuantity(definition);
  return formatQuantity(value, dimension, { unit });
}

import type { Measured } from "#app/engine/measured.ts";
import { STEP_KINDS } from "#app/engine/flow/model.ts";
import { LIMIT_DEFINITIONS, type LimitDefinition, type LimitKey, type SiteLimits } from "#app/engine/rules/limits.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { limitRule } from "#app/schemas/site-limit.ts";
import type { Change, ChangeSubject, LibrarySubject } from "#app/schemas/change-request.ts";
import type { FlowDetail, StepDetail } from "#app/schemas/flow-view.ts";
import { describedProperties, inputProperty, type InputProperty } from "./input-property.ts";
import { limitQuantity } from "./limit-quantity.ts";
import { planWithPeak } from "./step-edits.ts";
import type { QuantityRule } from "./read-quantity.ts";

/** A property that a change can set, with the rule that its new value is read by. */
export interface ChangeableProperty extends InputProperty {
  name: string;
  rule: QuantityRule;
}

const definitions: Record<LimitKey, LimitDefinition> = LIMIT_DEFINITIONS;

/** Properties of library records that the engine reads, with the widest value that makes sense of each. */
const RANGES: Record<LibrarySubject, Record<string, QuantityRule>> = {
  film: {
    stress: RULES.stress,
    youngsModulus: RULES.modulus,
    poissonsRatio: RULES.poissonsRatio,
    expansion: RULES.expansion,
    yieldStress: RULES.yieldStress,
    temperatureLimit: RULES.temperature,
  },
  carrier: {
    thickness: RULES.carrierThickness,
    youngsModulus: RULES.modulus,
    poissonsRatio: RULES.poissonsRatio,
    expansion: RULES.expansion,
    temperatureLimit: RULES.temperature,
  },
  bondingMaterial: {
    softening: RULES.temperature,
    temperatureLimit: RULES.temperature,
    bondTemperature: RULES.temperature,
    releaseTemperature: RULES.temperature,
    effectiveModulus: RULES.modulus,
    poissonsRatio: RULES.poissonsRatio,
    expansionBelow: RULES.expansion,
    expansionAbove: RULES.expansion,
  },
  equipment: {
    warpLimitEdgesUp: RULES.warpLimit,
    warpLimitEdgesDown: RULES.warpLimit,
    leastUnsupportedThickness: RULES.siliconThickness,
  },
};

/** What can be set of a kind of subject. A limit and a step have one property each. */
export function changeableProperties(subject: Pick<ChangeSubject, "kind" | "id">): ChangeableProperty[] {
  if (subject.kind === "step")
    return [{ name: "peakTemperature", ...inputProperty("flow", "peakTemperature"), rule: RULES.temperature }];
  if (subject.kind === "limit") {
    const definition = definitions[subject.id as LimitKey];
    return [{ name: "value", label: definition.title, ...limitQuantity(definition), rule: limitRule(definition) }];
  }
  const rules = RANGES[subject.kind];
  return describedProperties(subject.kind).flatMap(([name, property]) => {
    const rule = rules[name];
    return rule ? [{ name, ...property, rule }] : [];
  });
}

/** How a subject stands in an address: 'film:…'. */
export const subjectKey = ({ kind, id }: Pick<ChangeSubject, "kind" | "id">) => `${kind}:${id}`;

/** Limits and kinds of step that a change can be about; the library's records come from the library. */
export const SITE_SUBJECTS: readonly ChangeSubject[] = [
  ...STEP_KINDS.map((kind): ChangeSubject => ({ kind: "step", id: kind, name: kind })),
  ...(Object.keys(definitions) as LimitKey[]).map((key): ChangeSubject => ({
    kind: "limit",
    id: key,
    name: definitions[key].title,
  })),
];

/** A flow and the site's limits with a change made to them; null where the flow has nothing of it. What went in stays as it is. */
export function withChange(
  flow: FlowDetail,
  limits: SiteLimits,
  change: Change,
): { flow: FlowDetail; limits: SiteLimits } | null {
  const { subject, value } = change;
  if (subject.kind === "limit")
    return flow.steps.length === 0
      ? null
      : { flow, limits: { ...limits, [subject.id]: { ...limits[subject.id], value } } };
  const steps = structuredClone(flow.steps);
  const set = steps.filter((step) => setIn(step, change)).length;
  return set === 0 ? null : { flow: { ...flow, steps }, limits };
}

/** Makes a change in a step; whether there was anything to change. */
function setIn(step: StepDetail, { subject, property, value, title }: Change): boolean {
  switch (subject.kind) {
    case "step": {
      const meant = step.kind === subject.id && step.title.toLowerCase().includes(title.toLowerCase());
      if (meant) Object.assign(step, planWithPeak(step, value));
      return meant;
    }
    case "film": {
      const uses = step.films.filter(({ film, change }) => film.id === subject.id && change === "adds");
      if (property !== "stress") return uses.map(({ film }) => setOf(film, property, value)).length > 0;
      // A step that states a stress of its own does not follow the film's.
      const following = uses.filter(({ ownStress }) => ownStress === null);
      for (const use of following) use.stress = stated(use.stress, value);
      return following.length > 0;
    }
    case "carrier":
    case "bondingMaterial":
    case "equipment": {
      const record = step[subject.kind];
      if (record?.id !== subject.id) return false;
      setOf(record, property, value);
      return true;
    }
    case "limit":
      return false;
  }
}

function setOf(record: object, property: string, value: number): void {
  Object.assign(record, { [property]: stated((record as Record<string, Measured | null>)[property] ?? null, value) });
}

/** A value in place of another: its tolerance stays. */
const stated = (measured: Measured | null, value: number): Measured =>
  measured ? { ...measured, value, text: undefined } : { value, tolerance: null, source: "assumed" };

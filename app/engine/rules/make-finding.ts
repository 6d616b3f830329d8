import { provenance, type Measured } from "../measured.ts";
import type { StepState } from "../flow/walk.ts";
import type { Outcome } from "../vocabulary.ts";
import type { UnitSymbol } from "../working.ts";
import type { Figure, Finding, FindingLimit } from "./finding.ts";
import { LIMIT_DEFINITIONS, type LimitDefinition, type LimitKey, type SiteLimits } from "./limits.ts";

interface More {
  /** what would clear it; ignored when it is clear */
  remedy?: string | null;
  figures?: Figure[];
  limit?: FindingLimit | null;
}

export type FindingMaker = (state: StepState, outcome: Outcome, reason: string, more?: More) => Finding;

/** Makes a rule's findings. A clear one has no remedy, every other one must have. */
export function findingsOf(rule: number, title: string): FindingMaker {
  return (state, outcome, reason, { remedy = null, figures = [], limit = null } = {}) => ({
    rule,
    title,
    step: state.number,
    outcome,
    reason,
    figures,
    limit,
    remedy: outcome === "clear" ? null : remedy,
  });
}

/** A site's limit as a finding shows it. */
export function siteLimit(limits: SiteLimits, key: LimitKey): FindingLimit {
  const { title, unit, temperaturePoint }: LimitDefinition = LIMIT_DEFINITIONS[key];
  const { value, source } = limits[key];
  return { label: title, value, unit, temperaturePoint, source };
}

/** A limit that somebody stated for a material, carrier, tape or tool. */
export function statedLimit(
  label: string,
  measured: Measured,
  unit: UnitSymbol,
  temperaturePoint?: boolean,
): FindingLimit {
  return { label, value: measured.value, unit, temperaturePoint, source: provenance(measured) };
}

/** A temperature point as a figure. */
export function temperatureFigure(label: string, value: number): Figure {
  return { label, value, unit: "K", temperaturePoint: true };
}

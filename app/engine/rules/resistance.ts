import type { Resistance, Resistances, SolventFamily } from "../flow/handling-inputs.ts";
import type { StepInput } from "../flow/model.ts";
import { heatDuration } from "../flow/temperature-profile.ts";
import type { Exposure, Outcome } from "../vocabulary.ts";
import { againstUpperLimit } from "./against-limit.ts";
import { duration } from "./words.ts";

/** Exposures that a material's resistance decides, with the property that says it. */
const DECIDED_BY = {
  vacuum: "vacuum",
  plasma: "plasma",
  solvent: "solvent",
  acid: "acid",
  base: "base",
  "ultraviolet light": "ultraviolet",
} as const satisfies Partial<Record<Exposure, keyof Resistances>>;

export type DecidedExposure = keyof typeof DECIDED_BY;

export function isDecided(exposure: Exposure): exposure is DecidedExposure {
  return exposure in DECIDED_BY;
}

/** How long an exposure lasts, s: as stated, else as long as the step is hot, its whole profile where it has one, else null. */
export function exposureTime(step: StepInput, exposure: Exposure): number | null {
  return step.exposureTimes?.[exposure] ?? heatDuration(step);
}

export interface ResistanceFound {
  exposure: DecidedExposure;
  /** null where it is not known */
  outcome: Outcome | null;
  /** the end of a sentence that begins with the material's name */
  says: string;
}

/** What a material does in each exposure of a step that its resistances decide, `but` some that are judged elsewhere. */
export function againstExposures(
  step: StepInput,
  resistances: Resistances | null | undefined,
  but: readonly DecidedExposure[] = [],
): ResistanceFound[] {
  return step.exposures
    .filter(isDecided)
    .filter((exposure) => !but.includes(exposure))
    .map((exposure) => against(step, exposure, resistances ?? {}));
}

function against(step: StepInput, exposure: DecidedExposure, resistances: Resistances): ResistanceFound {
  const solvent = exposure === "solvent" ? bySolvent(step.solvent ?? null, resistances.attackedBy ?? []) : null;
  if (solvent) return { exposure, ...solvent };
  const stated: Resistance | null = resistances[DECIDED_BY[exposure]] ?? null;
  if (!stated || stated.word === "unknown")
    return { exposure, outcome: null, says: `is not known to stand ${exposure}` };
  if (stated.word === "attacked" && !stated.longest)
    return { exposure, outcome: "do not run", says: `is attacked by ${exposure}` };
  if (!stated.longest) return { exposure, outcome: "clear", says: `stands ${exposure}` };
  const time = exposureTime(step, exposure);
  const stands = `stands ${exposure} for ${duration(stated.longest)}`;
  if (time === null) return { exposure, outcome: null, says: `${stands}, and how long it lasts here is not given` };
  return {
    exposure,
    outcome: againstUpperLimit(time, stated.longest, 0, "do not run"),
    says: `${stands}, here ${duration(time)}`,
  };
}

function bySolvent(
  used: SolventFamily | null,
  attackedBy: readonly SolventFamily[],
): Omit<ResistanceFound, "exposure"> | null {
  if (attackedBy.length === 0) return null;
  const named = attackedBy.join(", ");
  if (used === null)
    return { outcome: "caution", says: `is attacked by ${named}, and which solvent is used is not given` };
  return attackedBy.includes(used) ? { outcome: "do not run", says: `is attacked by ${used}` } : null;
}

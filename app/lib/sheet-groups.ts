import type { Holding } from "#app/engine/vocabulary.ts";
import type { StepResult } from "#app/schemas/assessment-result.ts";

/** Consecutive steps on which the same thing holds the wafer. */
export interface SheetGroup {
  holding: Holding;
  /** what that is by name: the carrier, else the holding itself */
  heldBy: string;
  steps: StepResult[];
}

/** The flow in groups of what holds the wafer. Another carrier begins another group. */
export function sheetGroups(steps: readonly StepResult[]): SheetGroup[] {
  const groups: SheetGroup[] = [];
  for (const step of steps) {
    const last = groups.at(-1);
    if (last && last.holding === step.planned && last.heldBy === step.plannedName) last.steps.push(step);
    else groups.push({ holding: step.planned, heldBy: step.plannedName, steps: [step] });
  }
  return groups;
}

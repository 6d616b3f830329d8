import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { withPeak } from "#app/engine/flow/temperature-profile.ts";
import type { Measured } from "#app/engine/measured.ts";
import { tried as triedAt } from "#app/engine/trial/tried.ts";
import type { Holding } from "#app/engine/vocabulary.ts";
import type { FlowPlan, StepPlan } from "#app/schemas/flow-plan.ts";
import { planWithCarrier, planWithPeak } from "./step-edits.ts";
import type { WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";

/**
 * What-if: changes of single quantities, applied to what the engine takes (in the browser, while typing) and to the plan that is
 * stored (on the server, when the person says so). Both must come to the same flow, which a test holds.
 */

/** The quantity at the value tried. */
export const tried = (was: Measured | null, value: number): Measured => triedAt(was, value, "from a what-if");

/** The same change by the same place: a later one takes the place of an earlier. */
export const placeOf = ({ step, field, film }: Pick<WhatIfChange, "step" | "field" | "film">): string =>
  `${step} ${field} ${film ?? ""}`;

/** The snapshot's flow with changes. A change whose step or film is not there is passed over. */
export function changedInput(snapshot: WhatIfSnapshot, changes: readonly WhatIfChange[]): FlowInput {
  const steps = snapshot.input.steps.map((step, index) =>
    changes
      .filter((change) => change.step === snapshot.stepIds[index])
      .reduce((changed, change) => changedStep(changed, change, snapshot), step),
  );
  return { ...snapshot.input, steps };
}

function changedStep(step: StepInput, change: WhatIfChange, { carriers, materials }: WhatIfSnapshot): StepInput {
  const { bond } = step;
  switch (change.field) {
    case "siliconAfter":
      return { ...step, siliconAfter: tried(step.siliconAfter, change.value) };
    case "peakTemperature":
      return withPeak(step, change.value);
    case "planned":
      return { ...step, planned: change.value as Holding };
    case "carrier": {
      const carrier = carriers.find(({ id }) => id === change.value);
      return bond && carrier && bond.carrier.id !== carrier.id ? { ...step, bond: { ...bond, carrier } } : step;
    }
    case "bondingMaterial": {
      const material = materials.find(({ id }) => id === change.value);
      return bond && material ? { ...step, bond: { ...bond, material } } : step;
    }
    case "filmThickness":
    case "filmStress": {
      const key = change.field === "filmThickness" ? "thickness" : "stress";
      return {
        ...step,
        adds: step.adds.map((addition, at) =>
          at === change.film ? { ...addition, [key]: tried(addition[key], change.value) } : addition,
        ),
      };
    }
  }
}

/** Tells the stress in force of the film that a step adds as its nth: its own, else the film's. */
export type StressOf = (step: string, film: number) => Measured | null;

/** The stored plan with the same changes. */
export function changedPlan(plan: FlowPlan, changes: readonly WhatIfChange[], stressOf: StressOf): FlowPlan {
  const steps = plan.steps.map((step) =>
    changes
      .filter((change) => change.step === step.id)
      .reduce((changed, change) => changedPlanStep(changed, change, stressOf), step),
  );
  return { ...plan, steps };
}

function changedPlanStep(step: StepPlan, change: WhatIfChange, stressOf: StressOf): StepPlan {
  switch (change.field) {
    case "siliconAfter":
      return { ...step, siliconAfter: tried(step.siliconAfter, change.value) };
    case "peakTemperature":
      return planWithPeak(step, change.value);
    case "planned":
      return { ...step, planned: change.value as Holding };
    case "carrier":
      return step.carrier === null ? step : planWithCarrier(step, change.value);
    case "bondingMaterial":
      return step.bondingMaterial === null ? step : { ...step, bondingMaterial: change.value };
    case "filmThickness":
    case "filmStress": {
      let count = 0;
      const films = step.films.map((film) => {
        if (film.change !== "adds" || count++ !== change.film) return film;
        return change.field === "filmThickness"
          ? { ...film, thickness: tried(film.thickness, change.value) }
          : { ...film, stress: tried(stressOf(step.id, change.film), change.value) };
      });
      return { ...step, films };
    }
  }
}

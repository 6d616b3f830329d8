import { bondedFace, bondOn, type BondState } from "../flow/bond.ts";
import type { BondingMaterialInput } from "../flow/model.ts";
import { timeAbove, timesReached } from "../flow/temperature-profile.ts";
import type { StepState } from "../flow/walk.ts";
import { againstUpperLimit, reaches } from "./against-limit.ts";
import type { Finding, RuleContext } from "./finding.ts";
import { findingsOf, statedLimit } from "./make-finding.ts";
import { stepsUpTo } from "./other-steps.ts";
import { celsius, duration } from "./words.ts";

const make = findingsOf(6, "Bonding material");

/** Hot steps of a bond so far, this one included, its own debond and bond left out. */
function heatings({ steps, limits }: RuleContext, state: StepState, bond: BondState): StepState[] {
  const face = bondedFace(bond);
  const soFar = stepsUpTo(steps, state);
  const made = soFar
    .slice(0, -1)
    .findLastIndex(
      ({ step, before, after }) => step.kind === "bond" && !bondOn(before.bonds, face) && bondOn(after.bonds, face),
    );
  return soFar.slice(made + 1).filter(({ step }) => reaches(step.peakTemperature, limits.heatingFrom.value));
}

/** What the heat of all steps since the bond adds up to, judged at each step that adds to it. */
export function bondBudget(context: RuleContext, state: StepState, bond: BondState): Finding[] {
  const { material } = bond;
  const { thermalCycles, thermalTime, name } = material;
  if (!thermalCycles && !thermalTime) return [];
  const hot = heatings(context, state, bond);
  if (hot.at(-1) !== state) return [];
  const findings: Finding[] = [];
  const from = celsius(context.limits.heatingFrom.value);
  if (thermalCycles) {
    const count = hot.reduce((sum, { step }) => sum + timesReached(step, context.limits.heatingFrom.value), 0);
    const outcome = againstUpperLimit(count, thermalCycles.value, 0, "do not run");
    if (outcome !== "clear")
      findings.push(
        make(
          state,
          outcome,
          `Heating ${count} from ${from} up since the bond; ${name} stands ${thermalCycles.value}.`,
          {
            remedy: "Join hot steps, move one before the bond, or bond with a material that stands more.",
            figures: [{ label: "Heatings since the bond", value: count, unit: "1" }],
            limit: statedLimit(`${name}, heatings`, thermalCycles, "1"),
          },
        ),
      );
  }
  if (thermalTime) findings.push(...againstTime(state, hot, material, thermalTime, context.limits.heatingFrom.value));
  return findings;
}

function againstTime(
  state: StepState,
  hot: StepState[],
  { name }: BondingMaterialInput,
  most: NonNullable<BondingMaterialInput["thermalTime"]>,
  from: number,
): Finding[] {
  const times = hot.map(({ step, number }) => ({ number, time: timeAbove(step, from) }));
  const untimed = times.filter(({ time }) => time === null).map(({ number }) => number);
  const total = times.reduce((sum, { time }) => sum + (time ?? 0), 0);
  const limit = statedLimit(`${name}, total time hot`, most, "s");
  const figures: Finding["figures"] = [{ label: "Time hot since the bond", value: total, unit: "s" }];
  const outcome = againstUpperLimit(total, most.value, 0, "do not run");
  if (outcome === "clear" && untimed.length > 0)
    return [
      make(
        state,
        "cannot judge",
        `The time hot since the bond is not known: step ${untimed.join(", ")} has no hold time.`,
        {
          remedy: "Give the hold time of every hot step since the bond.",
          figures,
          limit,
        },
      ),
    ];
  if (outcome === "clear") return [];
  return [
    make(
      state,
      outcome,
      `${duration(total)} from ${celsius(from)} up since the bond; ${name} stands ${duration(most.value)}.`,
      {
        remedy: "Shorten the hot steps, move one before the bond, or bond with a material that stands more.",
        figures,
        limit,
      },
    ),
  ];
}

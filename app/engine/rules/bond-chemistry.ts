import type { BondState } from "../flow/bond.ts";
import type { BondingMaterialInput } from "../flow/model.ts";
import type { Resistances } from "../flow/handling-inputs.ts";
import type { StepState } from "../flow/walk.ts";
import { againstUpperLimit } from "./against-limit.ts";
import type { Finding, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit, statedLimit, temperatureFigure } from "./make-finding.ts";
import { againstExposures, type DecidedExposure } from "./resistance.ts";
import { celsius, percent } from "./words.ts";

const make = findingsOf(6, "Bonding material");

/**
 * What vacuum, chemicals and light do to a bonding material at a step. A resistance that is not known leads to 'cannot judge':
 * whether the pair stays together hangs on it. What it stands is said in one finding.
 */
export function bondChemistry(context: RuleContext, state: StepState, bond: BondState): Finding[] {
  const { material } = bond;
  const found = againstExposures(state.step, resistancesIn(state, material), unasked(bond));
  const stood = found.filter(({ outcome }) => outcome === "clear");
  const faults = found.flatMap(({ exposure, outcome, says }) => {
    if (outcome === "clear") return [];
    const remedy =
      outcome === null
        ? `Give what ${material.name} does in ${exposure}${says.includes("how long") ? ", and how long it lasts" : ""}.`
        : `Keep ${exposure} off the bond, shorten it, or bond with a material that stands it.`;
    return [make(state, outcome ?? "cannot judge", `${material.name} ${says}.`, { remedy })];
  });
  const clear =
    stood.length === 0 ? [] : [make(state, "clear", `${material.name} ${stood.map(({ says }) => says).join(", ")}.`)];
  return [...clear, ...faults, ...inVacuum(context, state, material)];
}

/**
 * What nobody asks of a bonding material unless its own data say something: plasma, which reaches its rim only, and light where
 * silicon keeps it off.
 */
function unasked({ carrier, material }: BondState): DecidedExposure[] {
  const seen = carrier.material === "glass";
  return [
    ...(material.resistances?.plasma ? [] : (["plasma"] as const)),
    ...(seen ? [] : (["ultraviolet light"] as const)),
  ];
}

/** What it stands. Its own remover takes it off before its debond too, as when the other face is cleaned of another bond. */
function resistancesIn({ step }: StepState, { resistances, remover }: BondingMaterialInput): Resistances {
  return remover && remover === step.solvent
    ? { ...resistances, attackedBy: [...(resistances?.attackedBy ?? []), remover] }
    : (resistances ?? {});
}

/** Outgassing: the temperature up to which it goes into vacuum, and the weight that it loses there. */
function inVacuum({ limits }: RuleContext, state: StepState, material: BondingMaterialInput): Finding[] {
  if (!state.step.exposures.includes("vacuum")) return [];
  const { vacuumTemperatureLimit, weightLoss, name } = material;
  const peak = state.step.peakTemperature;
  const findings: Finding[] = [];
  if (vacuumTemperatureLimit) {
    const most = vacuumTemperatureLimit.value;
    const outcome = againstUpperLimit(peak, most, 0, "do not run");
    if (outcome !== "clear")
      findings.push(
        make(
          state,
          outcome,
          `${celsius(peak)} in vacuum; ${name} takes ${celsius(most)} there before it gives off gas.`,
          {
            remedy: `Lower the peak to less than ${celsius(most)}, or bond with a material that takes more.`,
            figures: [temperatureFigure("Peak temperature in vacuum", peak)],
            limit: statedLimit(`${name}, temperature limit in vacuum`, vacuumTemperatureLimit, "K", true),
          },
        ),
      );
  }
  if (weightLoss) {
    const { weightLoss: most, weightLossClear: clear } = limits;
    const outcome = againstUpperLimit(weightLoss.value, most.value, most.value - clear.value, "do not run");
    if (outcome !== "clear")
      findings.push(
        make(state, outcome, `${name} loses ${percent(weightLoss.value)} of its weight in vacuum.`, {
          remedy: "Bake the pair before vacuum, or bond with a material that gives off less.",
          figures: [{ label: "Weight loss", value: weightLoss.value, unit: "1" }],
          limit: siteLimit(limits, "weightLoss"),
        }),
      );
  }
  return findings;
}

import { bondedFace, type BondState } from "../flow/bond.ts";
import type { BondingMaterialInput } from "../flow/model.ts";
import type { StepState } from "../flow/walk.ts";
import { SIDE_NAMES } from "../vocabulary.ts";
import { againstUpperLimit } from "./against-limit.ts";
import type { Finding } from "./finding.ts";
import { findingsOf, statedLimit } from "./make-finding.ts";
import { againstExposures } from "./resistance.ts";
import { forcePerWidth } from "./words.ts";

const make = findingsOf(8, "Debond on tape or ring");

/**
 * A wafer between two carriers leaves one and stays on the other: what lets one bond go must not let go the other. Heat, and the
 * chemicals and light of the step itself, are the bonding material rule's.
 */
export function staysOn(state: StepState, released: BondState, left: BondState): Finding[] {
  const faults = [
    ...byLight(state, released, left),
    ...byPeel(state, released, left),
    ...bySolvent(state, released, left),
  ];
  if (faults.length > 0) return faults;
  const { carrier } = left;
  return [make(state, "clear", `It stays on ${carrier.name}, bonded by its ${SIDE_NAMES[bondedFace(left)]}.`)];
}

/** Infrared passes silicon; ultraviolet does not. */
function byLight(state: StepState, released: BondState, left: BondState): Finding[] {
  const infrared = ({ material }: BondState) =>
    material.release.includes("laser") && material.releaseLight === "infrared";
  if (!infrared(released) || !infrared(left)) return [];
  return [
    make(
      state,
      "caution",
      `Infrared light lets go ${released.material.name} and passes the silicon: it can let go ${left.material.name} on the other face too.`,
      {
        remedy: "Choose bonds that let go in different ways, or show in a trial that the first one takes up the light.",
      },
    ),
  ];
}

const peels = ({ release }: BondingMaterialInput) => release === "mechanical peel";

/** Of two bonds that peel the weaker one opens. */
function byPeel(state: StepState, released: BondState, left: BondState): Finding[] {
  if (!peels(released.material) || !peels(left.material)) return [];
  const [pull, holds] = [released.material.peelForce, left.material.peelForce];
  const names = `${released.material.name} and ${left.material.name}`;
  const remedy = "Choose bonds that let go in different ways, or a weaker one on the face that is let go first.";
  if (!pull || !holds)
    return [
      make(
        state,
        "caution",
        `${names} both peel; which one opens first cannot be said: the peel force is not given of both.`,
        {
          remedy: `Give the peel force of ${names}.`,
        },
      ),
    ];
  const outcome = againstUpperLimit(pull.value, holds.value, 0, "do not run");
  return outcome === "clear"
    ? []
    : [
        make(
          state,
          outcome,
          `The peel pulls with ${forcePerWidth(pull.value)}; ${left.material.name}, which is to stay, lets go at ${forcePerWidth(holds.value)}.`,
          {
            remedy,
            figures: [{ label: "Peel force per width", value: pull.value, unit: "N/m" }],
            limit: statedLimit(`${left.material.name}, peel force`, holds, "N/m"),
          },
        ),
      ];
}

/** A release by solvent reaches the rim of the other bond even where the step states no solvent. */
function bySolvent(state: StepState, released: BondState, { material }: BondState): Finding[] {
  const { step } = state;
  if (released.material.release !== "solvent through perforated carrier" || step.exposures.includes("solvent"))
    return [];
  const solvent = step.solvent ?? released.material.remover ?? null;
  const found = againstExposures({ ...step, exposures: ["solvent"], solvent }, material.resistances);
  return found.flatMap(({ outcome, says }) =>
    outcome === "clear"
      ? []
      : [
          make(
            state,
            outcome ?? "cannot judge",
            `The solvent of the release reaches the other bond: ${material.name} ${says}.`,
            {
              remedy: "Choose bonds that let go in different ways.",
            },
          ),
        ],
  );
}

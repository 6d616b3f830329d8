import type { CarrierInput, ReleaseMethod } from "../flow/model.ts";
import type { BondState } from "../flow/bond.ts";
import type { StepState } from "../flow/walk.ts";
import type { Finding } from "./finding.ts";
import { findingsOf } from "./make-finding.ts";

const make = findingsOf(7, "Carrier");

const BY_LASER: ReleaseMethod[] = ["laser through glass", "laser through glass then peel"];

/** Whether light passes a carrier: silicon stops ultraviolet whatever is stated; null where it is not known. */
function passes(carrier: CarrierInput, light: "ultraviolet" | "infrared"): boolean | null {
  if (carrier.material === "silicon" && light === "ultraviolet") return false;
  return (light === "ultraviolet" ? carrier.passesUltraviolet : carrier.passesInfrared) ?? null;
}

/** Whether what lets the bond go reaches it through the carrier. */
export function releasePath(state: StepState, { carrier, material }: BondState): Finding[] {
  if (BY_LASER.includes(material.release)) return [light(state, carrier, material.releaseLight ?? "ultraviolet")];
  if (material.release === "solvent through perforated carrier") return [openings(state, carrier)];
  return [];
}

function light(state: StepState, carrier: CarrierInput, wanted: "ultraviolet" | "infrared"): Finding {
  const remedy = `Choose a carrier that ${wanted} light passes, or a bond that lets go in another way.`;
  const through = passes(carrier, wanted);
  if (through === null)
    return make(
      state,
      "cannot judge",
      carrier.material === "silicon"
        ? `The release needs infrared light through ${carrier.name}, which only low-doped silicon lets pass; that is not given.`
        : `The release needs ${wanted} light through ${carrier.name}; whether it passes is not given.`,
      { remedy: `Say whether ${wanted} light passes ${carrier.name}.` },
    );
  if (!through)
    return make(
      state,
      "do not run",
      `${capitalLight(wanted)} light does not pass ${carrier.name}, so the bond does not let go.`,
      {
        remedy,
      },
    );
  if (carrier.metalInLight === true)
    return make(state, "do not run", `Metal on ${carrier.name} stands in the way of the release light.`, { remedy });
  return make(state, "clear", `${capitalLight(wanted)} light passes ${carrier.name} and releases the bond.`);
}

const capitalLight = (light: "ultraviolet" | "infrared") => (light === "ultraviolet" ? "Ultraviolet" : "Infrared");

function openings(state: StepState, carrier: CarrierInput): Finding {
  const { perforated } = carrier;
  if (perforated === true)
    return make(state, "clear", `The solvent reaches the bond through the openings of ${carrier.name}.`);
  const remedy = "Choose a perforated carrier, or a bond that lets go without solvent.";
  if (perforated === false)
    return make(
      state,
      "do not run",
      `${carrier.name} has no openings: the solvent reaches the bond from its rim only.`,
      {
        remedy,
      },
    );
  return make(
    state,
    "cannot judge",
    `The solvent needs openings in ${carrier.name}; whether it has them is not given.`,
    {
      remedy: `Say whether ${carrier.name} is perforated.`,
    },
  );
}

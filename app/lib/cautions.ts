import type { CautionSignName } from "./sheet/caution-signs.ts";

/** A caution with its pictogram. */
export interface Caution {
  sign: CautionSignName;
  text: string;
}

/** What always stands beside an estimate: first that it is one, then what hurts people. */
export const CAUTIONS: readonly Caution[] = [
  {
    sign: "estimate",
    text: "Estimates support, never replace, qualified process engineering and the site’s own procedures and safety rules. Follow local codes and licensed or qualified practice.",
  },
  { sign: "shards", text: "Thin silicon breaks into razor-sharp shards: protect eyes and hands." },
  { sign: "blade", text: "Blades and grinders: guards closed, hands out." },
  { sign: "heat", text: "Hot plates and hot chucks burn, also after they are switched off." },
  { sign: "solvent", text: "Solvents: ventilate, and keep sparks and flames away." },
  { sign: "laser", text: "Laser debond only enclosed and interlocked." },
  { sign: "vacuum", text: "When vacuum is lost the wafer lets go: know what holds it then." },
  { sign: "run card", text: "A carrier, tape or gripper never replaces the run card." },
];

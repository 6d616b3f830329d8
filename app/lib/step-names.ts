import type { StepKind } from "#app/engine/flow/model.ts";

/** Kinds of step in at most twelve characters, for the head of a column in a strip. */
export const SHORT_STEP_NAMES: Record<StepKind, string> = {
  receive: "Receive",
  measure: "Measure",
  deposit: "Deposit",
  cure: "Cure",
  anneal: "Anneal",
  pattern: "Pattern",
  plate: "Plate",
  reflow: "Reflow",
  clean: "Clean",
  "edge trim": "Edge trim",
  "laminate tape": "Tape on",
  bond: "Bond",
  grind: "Grind",
  "stress relief": "Relieve",
  polish: "Polish",
  "via reveal": "Reveal",
  "back-side film": "Back film",
  "mount on frame": "Mount",
  debond: "Debond",
  dice: "Dice",
  move: "Move",
  store: "Store",
  hold: "Hold",
};

import type { Rule } from "./finding.ts";
import { thicknessRule } from "./rule-01-thickness.ts";
import { warpRule } from "./rule-02-warp.ts";
import { curlingRule } from "./rule-03-curling.ts";
import { holdingRule } from "./rule-04-holding.ts";
import { sagRule } from "./rule-05-sag.ts";
import { adhesiveRule } from "./rule-06-adhesive.ts";
import { carrierRule } from "./rule-07-carrier.ts";
import { debondRule } from "./rule-08-debond.ts";
import { coverRule } from "./rule-09-cover.ts";
import { edgeRule } from "./rule-10-edge.ts";
import { filmsRule } from "./rule-11-films.ts";
import { orderRule } from "./rule-12-order.ts";
import { provenanceRule } from "./rule-13-provenance.ts";
import { validityRule } from "./rule-14-validity.ts";
import { incomingRule } from "./rule-15-incoming.ts";
import { tapeRule } from "./rule-16-tape.ts";
import { clocksRule } from "./rule-17-clocks.ts";
import { contactRule } from "./rule-18-contact.ts";

/** The handling rules, in the order of their numbers. */
export const RULES: Rule[] = [
  thicknessRule,
  warpRule,
  curlingRule,
  holdingRule,
  sagRule,
  adhesiveRule,
  carrierRule,
  debondRule,
  coverRule,
  edgeRule,
  filmsRule,
  orderRule,
  provenanceRule,
  validityRule,
  incomingRule,
  tapeRule,
  clocksRule,
  contactRule,
];

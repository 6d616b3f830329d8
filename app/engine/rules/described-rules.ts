import type { Rule, RuleAbout } from "./finding.ts";
import { aboutThickness, thicknessRule } from "./rule-01-thickness.ts";
import { aboutWarp, warpRule } from "./rule-02-warp.ts";
import { aboutCurling, curlingRule } from "./rule-03-curling.ts";
import { aboutHolding, holdingRule } from "./rule-04-holding.ts";
import { aboutSag, sagRule } from "./rule-05-sag.ts";
import { aboutAdhesive, adhesiveRule } from "./rule-06-adhesive.ts";
import { aboutCarrier, carrierRule } from "./rule-07-carrier.ts";
import { aboutDebond, debondRule } from "./rule-08-debond.ts";
import { aboutCover, coverRule } from "./rule-09-cover.ts";
import { aboutEdge, edgeRule } from "./rule-10-edge.ts";
import { aboutFilms, filmsRule } from "./rule-11-films.ts";
import { aboutOrder, orderRule } from "./rule-12-order.ts";
import { aboutProvenance, provenanceRule } from "./rule-13-provenance.ts";
import { aboutValidity, validityRule } from "./rule-14-validity.ts";
import { aboutIncoming, incomingRule } from "./rule-15-incoming.ts";
import { aboutTape, tapeRule } from "./rule-16-tape.ts";
import { aboutClocks, clocksRule } from "./rule-17-clocks.ts";
import { aboutContact, contactRule } from "./rule-18-contact.ts";

/**
 * The handling rules with what each asks and which limits it reads, in the order of their numbers. Apart from `RULES`: whoever
 * judges a flow while somebody types has no use for these texts.
 */
export const DESCRIBED_RULES: (Rule & RuleAbout)[] = [
  { ...thicknessRule, ...aboutThickness },
  { ...warpRule, ...aboutWarp },
  { ...curlingRule, ...aboutCurling },
  { ...holdingRule, ...aboutHolding },
  { ...sagRule, ...aboutSag },
  { ...adhesiveRule, ...aboutAdhesive },
  { ...carrierRule, ...aboutCarrier },
  { ...debondRule, ...aboutDebond },
  { ...coverRule, ...aboutCover },
  { ...edgeRule, ...aboutEdge },
  { ...filmsRule, ...aboutFilms },
  { ...orderRule, ...aboutOrder },
  { ...provenanceRule, ...aboutProvenance },
  { ...validityRule, ...aboutValidity },
  { ...incomingRule, ...aboutIncoming },
  { ...tapeRule, ...aboutTape },
  { ...clocksRule, ...aboutClocks },
  { ...contactRule, ...aboutContact },
];

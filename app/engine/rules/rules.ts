import type { Rule } from "./finding.ts";
import { thicknessRule } from "./rule-01-thickness.ts";
import { warpRule } from "./rule-02-warp.ts";
import { adhesiveRule } from "./rule-06-adhesive.ts";
import { debondRule } from "./rule-08-debond.ts";
import { orderRule } from "./rule-12-order.ts";

/** The handling rules that this version judges, in the order of their numbers. */
export const RULES: Rule[] = [thicknessRule, warpRule, adhesiveRule, debondRule, orderRule];

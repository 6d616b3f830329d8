import { describe, expect, it } from "vitest";
import type { LimitKey } from "#app/engine/rules/limits.ts";
import { searchLimits, type LimitGroup, type LimitRow } from "#app/lib/limit-rows.ts";

describe("the search of limits", () => {
  const limit = (key: LimitKey, title: string): LimitRow => ({
    key,
    title,
    dimension: "length",
    unit: "µm",
    value: 1,
    source: key === "carrierBelow" ? "our own trials" : "common practice, no source",
    delivered: { value: 1, source: "" },
    version: 0,
    updatedAt: null,
    updatedBy: null,
  });
  const GROUPS: LimitGroup[] = [
    {
      rule: 1,
      title: "Thickness and support",
      limits: [limit("carrierBelow", "Carrier below"), limit("bareFrom200", "200 mm wafer: bare from")],
    },
    { rule: 2, title: "Warp", limits: [limit("flatWithin", "Called flat up to")] },
  ];
  const found = (query: string) => searchLimits(GROUPS, query).flatMap(({ limits }) => limits.map(({ key }) => key));

  it.each([
    ["", ["carrierBelow", "bareFrom200", "flatWithin"]],
    ["BARE 200", ["bareFrom200"]],
    ["trials", ["carrierBelow"]],
    ["warp", ["flatWithin"]],
    ["rule 2", ["flatWithin"]],
    ["12 parsecs", []],
  ])("“%s” finds %j", (query, keys) => {
    expect(found(query)).toEqual(keys);
  });
});

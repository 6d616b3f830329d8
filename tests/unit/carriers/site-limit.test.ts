import { describe, expect, it } from "vitest";
import { defaultLimits, LIMIT_DEFINITIONS, type LimitKey } from "#app/engine/rules/limits.ts";
import { limitQuantity, limitText } from "#app/lib/limit-quantity.ts";
import { isChanged } from "#app/lib/limit-rows.ts";
import { contradictions, limitsSchema } from "#app/schemas/site-limit.ts";
import { send } from "./forms.ts";

/** Values in SI: m, K, 1. */
const delivered = () => {
  const values = Object.entries(defaultLimits()).map(([key, { value }]) => [key, value]);
  return Object.fromEntries(values) as Record<LimitKey, number>;
};

describe("limits that depend on each other", () => {
  it("do not contradict each other as delivered", () => {
    expect(contradictions(delivered())).toEqual([]);
  });

  it.each([
    ["bareFrom150", 119e-6, "gripperFrom150"],
    ["bareFrom200", 179e-6, "gripperFrom200"],
    ["bareFrom300", 249e-6, "gripperFrom300"],
    ["gripperFrom200", 49e-6, "carrierBelow"],
    ["processCarrierBelow", 74e-6, "edgeRingFrom"],
    ["edgeRingFrom", 49e-6, "edgeRingLeast"],
    ["edgeRingLeast", 49e-6, "carrierBelow"],
    ["carrierBelow", 24e-6, "tapeInLineFrom"],
  ] as const)("are told apart: %s at %f m is less than %s", (more, value, less) => {
    expect(contradictions({ ...delivered(), [more]: value })).toContainEqual({ more, less });
  });

  it("may be equal", () => {
    expect(contradictions({ ...delivered(), bareFrom300: 250e-6 })).toEqual([]);
  });
});

describe("the form of limits", () => {
  const schema = limitsSchema(["bareFrom200", "tapeTemperature", "warpMargin", "adhesiveMargin"]);
  const row = (key: LimitKey, value: string) => ({
    [`${key}.value`]: value,
    [`${key}.source`]: "our own trials",
    [`${key}.opened.version`]: "1",
    [`${key}.opened.value`]: "0.0003",
    [`${key}.opened.source`]: "common practice, no source",
  });
  const SENT = {
    ...row("bareFrom200", "0.32 mm"),
    ...row("tapeTemperature", "75 C"),
    ...row("warpMargin", "25 %"),
    ...row("adhesiveMargin", "15 K"),
  };

  it("reads each limit in its own unit", () => {
    expect(send(schema, SENT).value).toMatchObject({
      bareFrom200: { value: expect.closeTo(320e-6, 12), opened: { version: 1, value: 0.0003 } },
      tapeTemperature: { value: expect.closeTo(348.15, 6) },
      warpMargin: { value: expect.closeTo(0.25, 12) },
      adhesiveMargin: { value: 15 },
    });
  });

  it.each([
    ["bareFrom200.value", "-1 um", "outside 0 to 2 mm"],
    ["bareFrom200.value", "", "Blank is missing, not zero"],
    ["bareFrom200.value", "12 parsecs", "parsecs is not a unit of length"],
    ["bareFrom200.source", " ", "Say where the limit comes from."],
    ["tapeTemperature.value", "80 K", "outside 0 °C to 400 °C"],
    ["warpMargin.value", "120 %", "outside 0 to 100 %"],
    ["adhesiveMargin.value", "20 °F", "°F is"],
  ])("refuses %s “%s” at its field", (field, typed, words) => {
    expect(send(schema, { ...SENT, [field]: typed }).errors[field]?.[0]).toContain(words);
  });
});

describe("a limit as text", () => {
  it.each([
    ["bareFrom300", "450\u00A0µm"],
    ["tapeTemperature", "80\u00A0°C"],
    ["adhesiveMargin", "20\u00A0K"],
    ["curlMargin", "70\u00A0%"],
  ] as const)("%s is shown in the unit of the trade", (key, text) => {
    const definition = LIMIT_DEFINITIONS[key];
    expect(limitText(definition.value, limitQuantity(definition))).toBe(text);
  });

  it("counts as changed only when its value is another", () => {
    const row = { value: 450e-6, delivered: { value: 450e-6 * (1 + 1e-12), source: "" } };
    expect(isChanged(row)).toBe(false);
    expect(isChanged({ ...row, value: 451e-6 })).toBe(true);
  });
});

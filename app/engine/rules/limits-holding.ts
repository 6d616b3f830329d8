import { PRACTICE, type LimitDefinition } from "./limit-definition.ts";

/** Limits of how a wafer or pair is held and carried: rules 3, 4, 5, 7. */
export const HOLDING_LIMITS = {
  curlMargin: {
    title: "Caution from this share of the critical load",
    value: 0.7,
    unit: "1",
    rule: 3,
    source: PRACTICE,
  },
  sealGapPlainClear: { title: "Plain vacuum seal: clear below", value: 0.3e-3, unit: "m", rule: 4, source: PRACTICE },
  sealGapPlain: { title: "Plain vacuum seal: closes up to", value: 1e-3, unit: "m", rule: 4, source: PRACTICE },
  sealGapCompliantClear: {
    title: "Compliant vacuum seal: clear below",
    value: 2e-3,
    unit: "m",
    rule: 4,
    source: PRACTICE,
  },
  sealGapCompliant: { title: "Compliant vacuum seal: closes up to", value: 5e-3, unit: "m", rule: 4, source: PRACTICE },
  stressGroundClear: { title: "Ground edge: clear below", value: 50e6, unit: "Pa", rule: 4, source: PRACTICE },
  stressGround: { title: "Ground edge: bending stress up to", value: 100e6, unit: "Pa", rule: 4, source: PRACTICE },
  stressRelieved: {
    title: "Relieved and trimmed: bending stress up to",
    value: 150e6,
    unit: "Pa",
    rule: 4,
    source: PRACTICE,
  },
  slotClear200: { title: "200 mm slots: clear below", value: 1e-3, unit: "m", rule: 5, source: PRACTICE },
  slot200: { title: "200 mm slots: sag plus warp up to", value: 1.5e-3, unit: "m", rule: 5, source: PRACTICE },
  slotClear300: { title: "300 mm slots: clear below", value: 2e-3, unit: "m", rule: 5, source: PRACTICE },
  slot300: { title: "300 mm slots: sag plus warp up to", value: 3e-3, unit: "m", rule: 5, source: PRACTICE },
  printThroughBelow: {
    title: "Openings of a carrier print through below",
    value: 100e-6,
    unit: "m",
    rule: 7,
    source: PRACTICE,
  },
} as const satisfies Record<string, LimitDefinition>;

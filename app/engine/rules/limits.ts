import { PRACTICE, type LimitDefinition } from "./limit-definition.ts";
import { HOLDING_LIMITS } from "./limits-holding.ts";
import { PROCESS_LIMITS } from "./limits-process.ts";

export type { LimitDefinition };

/** Every limit that the rules judge against. */
export const LIMIT_DEFINITIONS = {
  bareFrom150: { title: "150 mm wafer: bare from", value: 250e-6, unit: "m", rule: 1, source: PRACTICE },
  bareFrom200: { title: "200 mm wafer: bare from", value: 300e-6, unit: "m", rule: 1, source: PRACTICE },
  bareFrom300: { title: "300 mm wafer: bare from", value: 450e-6, unit: "m", rule: 1, source: PRACTICE },
  gripperFrom150: {
    title: "150 mm wafer: thin-wafer gripper from",
    value: 120e-6,
    unit: "m",
    rule: 1,
    source: PRACTICE,
  },
  gripperFrom200: {
    title: "200 mm wafer: thin-wafer gripper from",
    value: 180e-6,
    unit: "m",
    rule: 1,
    source: PRACTICE,
  },
  gripperFrom300: {
    title: "300 mm wafer: thin-wafer gripper from",
    value: 250e-6,
    unit: "m",
    rule: 1,
    source: PRACTICE,
  },
  carrierBelow: {
    title: "Carrier for any free-standing step below",
    value: 50e-6,
    unit: "m",
    rule: 1,
    source: PRACTICE,
  },
  tapeInLineFrom: {
    title: "Grinding tape to frame, in line, from",
    value: 25e-6,
    unit: "m",
    rule: 1,
    source: PRACTICE,
  },
  processCarrierBelow: {
    title: "Carrier for lithography, heat, vacuum, plasma, plating or polishing below",
    value: 150e-6,
    unit: "m",
    rule: 1,
    source: PRACTICE,
  },
  edgeRingFrom: { title: "Edge ring instead of a carrier from", value: 75e-6, unit: "m", rule: 1, source: PRACTICE },
  edgeRingLeast: {
    title: "Edge ring instead of a carrier, with caution, from",
    value: 50e-6,
    unit: "m",
    rule: 1,
    source: PRACTICE,
  },
  tapeTemperature: {
    title: "Highest temperature on tape or film frame",
    value: 353.15,
    unit: "K",
    temperaturePoint: true,
    rule: 1,
    source: PRACTICE,
  },
  warpMargin: {
    title: "Caution from this share of a warp limit below it",
    value: 0.2,
    unit: "1",
    rule: 2,
    source: PRACTICE,
  },
  flatWithin: { title: "Called flat up to", value: 15e-6, unit: "m", rule: 2, source: PRACTICE },
  ...HOLDING_LIMITS,
  ...PROCESS_LIMITS,
} as const satisfies Record<string, LimitDefinition>;

export type LimitKey = keyof typeof LIMIT_DEFINITIONS;

/** A site's own limits: value in SI and where it comes from. */
export type SiteLimits = Record<LimitKey, { value: number; source: string }>;

/** The limits as delivered. */
export function defaultLimits(): SiteLimits {
  const entries = Object.entries(LIMIT_DEFINITIONS).map(([key, { value, source }]) => [key, { value, source }]);
  return Object.fromEntries(entries) as SiteLimits;
}

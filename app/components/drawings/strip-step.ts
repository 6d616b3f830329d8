import type { Holding, Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import type { BowShape } from "./bow-shape.ts";

/** One step as the strip draws it. Numbers are SI; what is printed comes as text. */
export interface StripStep {
  number: number;
  /** At most 12 characters. */
  shortName: string;
  name: string;
  /** Thickness after the step, m, and as printed, in µm without the unit. */
  silicon: { thickness: number; text: string };
  /** Highest temperature, K, and as printed, in °C without the unit. */
  temperature: { peak: number; text: string };
  bow: {
    shape: BowShape;
    deviceSideUp: boolean;
    holding: Holding;
    /** Only for a line that was set aside from the page's exaggeration. */
    exaggeration?: number;
  };
  /** Warp as a fraction of the tool's own limit, with its expanded uncertainty as the same fraction; null when held. */
  warp: { fraction: number; uncertainty: number } | null;
  required: SupportClass;
  /** What is planned to hold the wafer, in words; null where it is bare. */
  planned: string | null;
  outcome: Outcome;
  selected?: boolean;
  /** Where selecting the step leads; works without scripts. */
  href?: string;
}

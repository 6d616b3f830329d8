import type { WaferState } from "../flow/state.ts";
import type { FindingLimit } from "./finding.ts";
import type { SiteLimits } from "./limits.ts";
import { siteLimit, statedLimit } from "./make-finding.ts";

/** What it is on, by the tape's own name where that is known. */
export function tapeName({ tape, mount }: Pick<WaferState, "tape" | "mount">): string {
  return tape ? tape.name : `the ${mount ?? "tape"}`;
}

/** Highest temperature on what it is on: the tape's own, else the site's for tape. */
export function tapeHeatLimit({ tape }: Pick<WaferState, "tape">, limits: SiteLimits): FindingLimit {
  return tape?.temperatureLimit
    ? statedLimit(`${tape.name}, temperature limit`, tape.temperatureLimit, "K", true)
    : siteLimit(limits, "tapeTemperature");
}

/** Whether there is tape under the whole wafer: an edge ring holds its rim only. */
export function onTape({ mount }: Pick<WaferState, "mount">): boolean {
  return mount === "grinding tape" || mount === "film frame";
}

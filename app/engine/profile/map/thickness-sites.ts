import { EngineInputError } from "../../errors.ts";
import { requireThickness } from "../../inputs.ts";
import type { SiteColumns } from "./fit-surface.ts";

export interface ThicknessFigures {
  /** m, of the wafer alone */
  mean: number;
  /** at the site nearest the centre */
  centre: number;
  least: number;
  most: number;
  /** most less least over the sites */
  ttv: number;
  /** standard deviation over the sites */
  standardDeviation: number;
  sites: number;
}

/**
 * Thickness of a wafer from a map of 2 sites and more (usually 5 to 49), `z` being the thickness as read. A tape or carrier under
 * the wafer, `under` (m), is taken off. TTV over sites is a lower bound of that over the whole area.
 * Source: Marks, Hassan and Cheong 2014 for TTV.
 * @throws EngineInputError for fewer than two sites, or one whose thickness is out of range
 */
export function thicknessFigures(sites: SiteColumns, under = 0): ThicknessFigures {
  const count = sites.z.length;
  if (count < 2) throw new EngineInputError("sites", `${count} are too few`, "at least 2");
  const values = Array.from(sites.z, (value, n) => requireThickness(`sites[${n}].z`, value - under));
  const mean = values.reduce((sum, value) => sum + value, 0) / count;
  const [least, most] = [Math.min(...values), Math.max(...values)];
  let [nearest, centre] = [Number.POSITIVE_INFINITY, mean];
  values.forEach((value, n) => {
    const distance = Math.hypot(sites.x[n] ?? 0, sites.y[n] ?? 0);
    if (distance < nearest) [nearest, centre] = [distance, value];
  });
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return {
    mean,
    centre,
    least,
    most,
    ttv: most - least,
    standardDeviation: Math.sqrt(squares / (count - 1)),
    sites: count,
  };
}

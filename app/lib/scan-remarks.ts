import { formatQuantity } from "#app/engine/units/format.ts";
import type { ScanParameters, ScanResult } from "#app/schemas/scan-result.ts";
import { COVERAGE } from "./scan-answer.ts";

/** Something to mind about a scan. A caution bears on whether the figure may be used, a note only on how it was made. */
export interface ScanRemark {
  level: "caution" | "note";
  text: string;
}

/** Share of the fourth-order term from which a change of shape is not spherical. */
const NOT_SPHERICAL = 0.05;
/** Silicon below which a stylus bends what it measures; common practice, no source. */
const CONTACT_FROM = 300e-6;
/** Scope of the bow and warp standards; SEMI MF534 and MF1390. */
const STANDARDS_FROM = 100e-6;
const UNDERSTATED_FROM = 0.01;
/** Error of the thin-film relation for a film as stiff as the wafer, as film over wafer thickness times this. */
const THICK_FILM = 3;
const WORTH_SAYING = 0.05;
const SHORT_SCAN = 0.8;

const percent = (share: number) => `${formatQuantity(share, "fraction", { unit: "%", significant: 2, trim: true })}`;
const mm = (metres: number) => formatQuantity(metres, "length", { unit: "mm", significant: 3, trim: true });

/**
 * What stands against trusting a scan's figures, the weightiest first; empty when nothing does. Of a wafer that has rolled there
 * is no stress and no bow, so nothing is said about how good they are.
 */
export function scanRemarks(parameters: ScanParameters, result: ScanResult): ScanRemark[] {
  const found = result.curled
    ? [ROLLED, ...handlingRemarks(parameters), ...fitRemarks(result)]
    : [
        ...shapeRemarks(result),
        ...handlingRemarks(parameters),
        thickFilm(parameters),
        missingTolerances(result),
        insideUncertainty(result),
        shortScan(parameters, result),
        ...fitRemarks(result),
      ];
  return found.filter((remark) => remark !== null);
}

function caution(text: string): ScanRemark {
  return { level: "caution", text };
}

function note(text: string): ScanRemark {
  return { level: "note", text };
}

const ROLLED = caution(
  "A free wafer of this thickness cannot hold that curvature as a bowl: it has rolled about one axis, where the thin-film relation does not hold. Neither a stress nor a bow is given.",
);

function shapeRemarks({ understatedBy, quartic }: ScanResult): (ScanRemark | null)[] {
  return [
    understatedBy !== null && understatedBy >= UNDERSTATED_FROM
      ? caution(
          `The bow is large for this silicon, which is then stiffer than the thin-film relation assumes: the stress is understated by about ${percent(understatedBy)}.`,
        )
      : null,
    Math.abs(quartic) > NOT_SPHERICAL
      ? caution(
          `The change of shape is not spherical: ${percent(Math.abs(quartic))} of it is of fourth order. The film varies over the wafer, or the deflection is large.`,
        )
      : null,
  ];
}

function handlingRemarks({ siliconThickness }: ScanParameters): (ScanRemark | null)[] {
  return [
    siliconThickness < CONTACT_FROM
      ? caution(
          "Silicon below 300\u00A0µm: a stylus presses it out of shape. Scan without contact, or on thicker silicon.",
        )
      : null,
    siliconThickness < STANDARDS_FROM
      ? caution(
          "Silicon below about 100\u00A0µm is outside the scope of the standards for bow and warp, SEMI MF534 and MF1390: say how it was held when you quote the figure.",
        )
      : null,
  ];
}

function thickFilm({ siliconThickness, filmThickness }: ScanParameters): ScanRemark | null {
  const off = (THICK_FILM * filmThickness) / siliconThickness;
  if (off < WORTH_SAYING) return null;
  return caution(
    `The film is thick for this silicon: if it is as stiff, the thin-film relation is about ${percent(off)} off.`,
  );
}

function insideUncertainty({ stress, stressUncertainty }: ScanResult): ScanRemark | null {
  if (Math.abs(stress) > COVERAGE * stressUncertainty) return null;
  return caution("The stress is smaller than its uncertainty: this pair of scans cannot tell it from zero.");
}

function fitRemarks(result: ScanResult): (ScanRemark | null)[] {
  return [
    result.rejected > 0 ? note(leftOut(result)) : null,
    result.steep ? note("The scan is steeper than 0.03, so circles were fitted instead of parabolas.") : null,
  ];
}

function missingTolerances({ budget }: ScanResult): ScanRemark | null {
  const missing = budget.filter(({ given }) => !given).map(({ input }) => input);
  if (missing.length === 0) return null;
  return caution(
    `No tolerance was given for the ${missing.join(" and the ")}: the ± is too small by what ${missing.length === 1 ? "it" : "they"} would add.`,
  );
}

function shortScan({ diameter }: ScanParameters, { from, to }: ScanResult): ScanRemark | null {
  if (to - from >= SHORT_SCAN * diameter) return null;
  return note(
    `Both scans cover ${mm(to - from)} of the ${mm(diameter)} wafer; the bow is that of the whole wafer at the same curvature.`,
  );
}

function leftOut({ rejected, rejectedAt }: ScanResult): string {
  const places = rejectedAt.map((x) => formatQuantity(x, "length", { unit: "mm", decimals: 1 }).replace(/\s?mm$/, ""));
  const more = rejected > rejectedAt.length ? " and elsewhere" : "";
  return `The fit left out ${rejected === 1 ? "1 point" : `${rejected} points`} more than 4.7 times the scatter off the parabola, at ${places.join(", ")}\u00A0mm${more}.`;
}

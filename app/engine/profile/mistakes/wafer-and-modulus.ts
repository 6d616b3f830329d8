import { formatQuantity } from "../../units/format.ts";
import { cannotTell, notSeen, seen, type Mistake } from "./mistake.ts";
import { APART } from "./scan-checks.ts";

/** Nominal wafers, m: diameter and thickness (SEMI M1, from memory; thicknesses as suppliers list them). */
const NOMINAL = [
  [0.0508, 279e-6],
  [0.0762, 381e-6],
  [0.1, 525e-6],
  [0.125, 625e-6],
  [0.15, 675e-6],
  [0.2, 725e-6],
  [0.3, 775e-6],
] as const;
/** Tolerance of a new wafer's thickness, m (SEMI M1, from memory). */
const NEW_WAFER = 25e-6;
/** A thickness that is a nominal one to this digit was typed, not measured, m. */
const TO_THE_DIGIT = 5e-8;

const um = (metres: number) => formatQuantity(metres, "length", { unit: "µm", significant: 4, trim: true });
const percent = (share: number) =>
  formatQuantity(share, "fraction", { unit: "%", significant: 2, sign: true, trim: true });

export const nominalThickness: Mistake = {
  number: 4,
  name: "Nominal instead of measured thickness",
  asks: "Is the thickness that the stress is computed with a nominal one? It enters squared.",
  remedy: "Measure the wafer's thickness and compute with that.",
  falseAlarms: 0.002,
  judge({ wafer }) {
    const read = "thickness used and where it comes from";
    if (!wafer) return cannotTell(read, "No thickness is there.");
    const { thickness, thicknessFrom, measured } = wafer;
    const figure = { label: "Thickness used", value: thickness, unit: "m" as const };
    const isNominal = NOMINAL.some(([, nominal]) => Math.abs(thickness - nominal) < TO_THE_DIGIT);
    if (measured && (isNominal || thicknessFrom === "nominal")) {
      const off = (thickness / measured.value) ** 2 - 1;
      return Math.abs(thickness - measured.value) > Math.max(APART * measured.standardUncertainty, TO_THE_DIGIT)
        ? seen(
            read,
            `Computed with ${um(thickness)} although the wafer measures ${um(measured.value)}: the stress is ${percent(off)} off.`,
            figure,
          )
        : notSeen(read, "The nominal thickness is also the measured one.", figure);
    }
    if (thicknessFrom === "nominal")
      return seen(
        read,
        `${um(thickness)} is the nominal thickness; a wafer ${um(NEW_WAFER)} off it makes ${percent(2 * (NEW_WAFER / thickness))}.`,
        figure,
      );
    if (isNominal && thicknessFrom !== "measured")
      return cannotTell(read, `${um(thickness)} is a nominal thickness; whether it was measured is not said.`, figure);
    return notSeen(read, "The thickness is a measured one.", figure);
  },
};

export const otherDiametersThickness: Mistake = {
  number: 5,
  name: "725 for 775 µm",
  asks: "Is the thickness the nominal one of another diameter? 725 for 775 µm makes −13 %.",
  remedy: "Compute with the thickness of this wafer.",
  falseAlarms: 0.002,
  judge({ wafer }) {
    const read = "thickness used, diameter and measured thickness";
    if (!wafer) return cannotTell(read, "No wafer is there.");
    const own = NOMINAL.find(([diameter]) => Math.abs(wafer.diameter - diameter) < 0.02 * diameter)?.[1];
    const truth = wafer.measured?.value ?? own;
    const figure = { label: "Thickness used", value: wafer.thickness, unit: "m" as const };
    if (truth === undefined)
      return cannotTell(read, "The diameter has no nominal thickness, and none was measured.", figure);
    const other = NOMINAL.find(([, nominal]) => Math.abs(wafer.thickness - nominal) < TO_THE_DIGIT)?.[1];
    if (other === undefined || other === own || Math.abs(wafer.thickness - truth) <= NEW_WAFER)
      return notSeen(read, "The thickness is not that of another diameter.", figure);
    // A thinned wafer may have any thickness: without a measurement only a new wafer's nominal speaks against it.
    if (!wafer.measured && wafer.thicknessFrom === "measured")
      return notSeen(read, "The thickness is said to be measured.", figure);
    return seen(
      read,
      `${um(wafer.thickness)} is the nominal thickness of another diameter; this wafer has ${um(truth)}: the stress is ${percent((wafer.thickness / truth) ** 2 - 1)} off.`,
      figure,
    );
  },
};

/** E of <110> silicon with the ν of <100>: 169 GPa and 0.28 give a modulus that no silicon face has. */
const MIXED = 169e9 / (1 - 0.28);
/** Ratios of moduli within this count as equal. */
const MODULUS_WITHIN = 0.015;

export const mixedConstants: Mistake = {
  number: 6,
  name: "E 169 GPa with ν 0.28",
  asks: "Was the stress reduced with Young's modulus of one direction and Poisson's ratio of another? On (100) that makes +30 %.",
  remedy: "Compute with 180.2 GPa for (100) silicon, whatever the pair that it comes from.",
  falseAlarms: 0.002,
  judge({ biaxialModulus, expectedModulus, reduced }) {
    const near = (value: number, target: number) => Math.abs(value / target - 1) < MODULUS_WITHIN;
    const read = "biaxial modulus, or the tool's stress over the recomputed one";
    if (biaxialModulus) {
      const figure = { label: "Biaxial modulus used", value: biaxialModulus, unit: "Pa" as const };
      const off = expectedModulus ? biaxialModulus / expectedModulus - 1 : 0.3;
      return near(biaxialModulus, MIXED) && !(expectedModulus && near(expectedModulus, MIXED))
        ? seen(read, `The modulus is that of E 169 GPa with ν 0.28: the stress is ${percent(off)} off.`, figure)
        : notSeen(read, "The modulus is not that of mixed constants.", figure);
    }
    if (!reduced || reduced.recomputed === 0) return cannotTell(read, "The tool's modulus is not known.");
    const ratio = reduced.byTool / reduced.recomputed;
    const figure = { label: "Tool's stress over the recomputed one", value: ratio, unit: "1" as const };
    return near(ratio, MIXED / (expectedModulus ?? 180.2e9))
      ? seen(read, `The tool's stress is ${percent(ratio - 1)} over: as with E 169 GPa and ν 0.28.`, figure)
      : notSeen(read, "The tool's stress does not differ as with mixed constants.", figure);
  },
};

import type { Scan } from "#app/db/entities/scan.ts";
import type { Film } from "#app/db/entities/film.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { stressBothWays } from "#app/engine/profile/stress/full-model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { COVERAGE } from "#app/lib/scan-answer.ts";
import type { BothStresses } from "#app/schemas/film-analysis.ts";
import type { ScanResult } from "#app/schemas/scan-result.ts";

/** What a scan would give its film's history, SI. */
export interface ScanStress {
  value: number;
  standardUncertainty: number;
  commonUncertainty: number;
  /** said where it is not the thin-film stress of the scan's page */
  remark: string | null;
}

/** What silicon's modulus adds is the same in every scan. */
const SHARED = "biaxial modulus";

/**
 * The stress of a scan that a film's history takes: by the thin-film relation, or by the full model where the two differ by more
 * than 1 %. A sentence where there is none to take.
 * @param analysed what the scan's page says of it, whose uncertainty holds the instrument's repeatability too; null where it says
 *   nothing, which leaves the uncertainty that the scan was stored with
 */
export function scanStress(
  { parameters }: Pick<Scan, "parameters">,
  result: ScanResult,
  film: Pick<Film, "youngsModulus" | "poissonsRatio">,
  analysed: BothStresses | null,
): ScanStress | string {
  if (result.curled) return "The wafer has rolled up, so this scan gives no stress. Scan it on thicker silicon.";
  if (!(result.stressUncertainty > 0)) return "The scan has no uncertainty, so it cannot be weighed against others.";
  try {
    const both = stressBothWays({
      before: result.curvatureBefore,
      after: result.curvatureAfter,
      radius: parameters.diameter / 2,
      substrateThickness: parameters.siliconThickness,
      orientation: parameters.orientation,
      filmThickness: parameters.filmThickness,
      film: { youngsModulus: film.youngsModulus.value, poissonsRatio: film.poissonsRatio.value },
    });
    if (both.full === null) return "The wafer is about to roll up, so this scan gives no stress. Scan thicker silicon.";
    const value = both.differs ? both.full : result.stress;
    const scale = result.stress === 0 ? 1 : Math.abs(value / result.stress);
    const shared = result.budget.find(({ input }) => input === SHARED)?.contribution ?? 0;
    const said = both.differs ? analysed?.full : analysed?.stoney;
    return {
      value,
      standardUncertainty: said ? said.uncertainty / COVERAGE : scale * result.stressUncertainty,
      commonUncertainty: scale * shared,
      remark: both.differs ? fullModelRemark(result.stress, value) : null,
    };
  } catch (error) {
    if (error instanceof EngineInputError) return `The scan cannot be accepted: the ${error.field} ${error.reason}.`;
    throw error;
  }
}

const MPa = (value: number) => formatQuantity(value, "stress", { unit: "MPa", significant: 4 });

const fullModelRemark = (thin: number, full: number) =>
  `The film is too thick or the bow too large for the thin-film relation, which gives ${MPa(thin)}: the full model’s ${MPa(full)} is taken.`;

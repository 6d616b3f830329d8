import { COVERAGE } from "#app/lib/scan-answer.ts";
import { USUAL_BOW_UNCERTAINTY } from "#app/lib/usual-bow.ts";

/** Standard uncertainty of a measured bow of which somebody stated the expanded one, k = 2, m; null for the usual one. */
export const standardUncertaintyOf = (expanded: number | null) =>
  expanded === null
    ? { standardUncertainty: USUAL_BOW_UNCERTAINTY, stated: false }
    : { standardUncertainty: expanded / COVERAGE, stated: true };

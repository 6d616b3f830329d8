import type { Exposure } from "#app/engine/vocabulary.ts";

/** An exposure as part of a field's name, which has no blanks. */
export const exposureKey = (exposure: Exposure): string => exposure.replaceAll(" ", "_");

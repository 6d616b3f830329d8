import { requireThickness } from "../inputs.ts";

/**
 * How an adhesive covers the bumps under it: `ratio` is bump height over adhesive thickness (both m), `left` the adhesive over
 * the bumps, m, negative when they stand out. Common practice, no source: at most 0.70, with 5 to 10 µm left.
 * Bad input throws `EngineInputError`.
 */
export function bumpCover(i: { bumpHeight: number; adhesiveThickness: number }): { ratio: number; left: number } {
  const bump = requireThickness("bumpHeight", i.bumpHeight);
  const adhesive = requireThickness("adhesiveThickness", i.adhesiveThickness);
  return { ratio: bump / adhesive, left: adhesive - bump };
}

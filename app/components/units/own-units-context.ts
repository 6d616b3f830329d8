import { createContext, useContext } from "react";
import type { CsvMark } from "#app/lib/csv.ts";
import type { OwnUnits } from "#app/lib/own-units.ts";
import { DEFAULT_PREFERENCES } from "#app/lib/preferences.ts";

/** What of a person's preferences says how figures are written. */
type OwnFigures = OwnUnits & { decimalMark: CsvMark };

const Context = createContext<OwnFigures>(DEFAULT_PREFERENCES);

/** Gives all that is inside the units of the person who reads it. */
export const OwnUnitsProvider = Context.Provider;

/** The units in which whoever reads this page wants figures; as delivered outside of the frame, so on every sheet. */
export const useOwnUnits = (): OwnUnits => useContext(Context);

/** The decimal mark of a file that is made in the page. */
export const useCsvMark = (): CsvMark => useContext(Context).decimalMark;

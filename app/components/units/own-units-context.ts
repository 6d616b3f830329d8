import { createContext, useContext } from "react";
import { DELIVERED_UNITS, type OwnUnits } from "#app/lib/own-units.ts";

const Context = createContext<OwnUnits>(DELIVERED_UNITS);

/** Gives all that is inside the units of the person who reads it. */
export const OwnUnitsProvider = Context.Provider;

/** The units in which whoever reads this page wants figures; as delivered outside of the frame, so on every sheet. */
export const useOwnUnits = () => useContext(Context);

import { requireWithin } from "../inputs.ts";

/** Stiffness of cubic silicon along its cube axes. */
export interface CubicStiffness {
  /** Pa */
  c11: number;
  /** Pa */
  c12: number;
  /** Pa */
  c44: number;
}

/** Lightly doped silicon at 25 °C; heavy doping changes these by up to some 3 %. */
const AT_25C: CubicStiffness = { c11: 165.64e9, c12: 63.94e9, c44: 79.51e9 };

/** Relative change per kelvin, valid from 150 to 1000 K. */
const PER_KELVIN: CubicStiffness = { c11: -9.4e-5, c12: -9.8e-5, c44: -8.3e-5 };

const REFERENCE_TEMPERATURE = 298.15;

/**
 * Elastic constants of silicon, Pa, at `temperature` (K, default 298.15), linear in temperature from the values at 25 °C.
 * Range 150 to 1000 K, the range of the temperature coefficients; outside it throws `EngineInputError`.
 * Source: technical note 'Basic Mechanical and Thermal Properties of Silicon', its reference 6.
 */
export function siliconStiffness(temperature: number = REFERENCE_TEMPERATURE): CubicStiffness {
  const rise = requireWithin("temperature", temperature, 150, 1000, "K") - REFERENCE_TEMPERATURE;
  return {
    c11: AT_25C.c11 * (1 + PER_KELVIN.c11 * rise),
    c12: AT_25C.c12 * (1 + PER_KELVIN.c12 * rise),
    c44: AT_25C.c44 * (1 + PER_KELVIN.c44 * rise),
  };
}

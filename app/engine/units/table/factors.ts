/* Made by `npm run unit-table` from the units package; not to be edited. */

/** How many of its dimension's SI unit each unit is, by the package's name. */
export const FACTORS: Readonly<Record<string, number>> = {
  um: 0.000001,
  nm: 1e-9,
  mm: 0.001,
  cm: 0.01,
  m: 1,
  angstrom: 1e-10,
  inch: 0.0254,
  mil: 0.0000254,
  MPa: 1000000,
  GPa: 1000000000,
  Pa: 1,
  kPa: 1000,
  "dyn/cm^2": 0.1,
  "lbf/in^2": 6894.757293168362,
  degC: 1,
  K: 1,
  degF: 0.5555555555555556,
  "K^-1": 1,
  "N/m": 1,
  "mN/m": 0.001,
  "kN/m": 1000,
  "dyn/cm": 0.001,
  "m^-1": 1,
  "km^-1": 0.001,
  "mm^-1": 1000,
  minute: 60,
  hour: 3600,
  s: 1,
  day: 86400,
  "kg/m^3": 1,
  "g/cm^3": 999.9999999999999,
  g: 0.001,
  kg: 1,
  mg: 0.000001,
  deg: 0.017453292519943295,
  mrad: 0.001,
  rad: 1,
};

/** Where the scales that do not begin at absolute zero have their zero, K. */
export const ZEROS: Readonly<Record<string, number>> = {
  degC: 273.15,
  degF: 255.37222222222223,
};

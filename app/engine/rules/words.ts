import { formatQuantity } from "../units/format.ts";

/** Figures as they stand in a finding's sentence: the unit that the trade says, rounded to what a hand can use. */

/** A length in µm: tenths below 10 µm, whole from there, four digits where a decimal was stated. */
export const micrometres = (value: number) =>
  formatQuantity(value, "length", { unit: "µm", significant: 4, trim: true });
/** A bow or warp in whole µm. */
export const wholeMicrometres = (value: number) => formatQuantity(value, "length", { unit: "µm", decimals: 0 });
/** A bow, lift or sag of any size: whole µm below a millimetre, three digits in mm from there. */
export const height = (value: number) => (value < 0.9995e-3 ? wholeMicrometres(value) : millimetres(value));
export const millimetres = (value: number) =>
  formatQuantity(value, "length", { unit: "mm", significant: 3, trim: true });
export const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C", decimals: 0 });
export const kelvins = (difference: number) =>
  formatQuantity(difference, "temperatureDifference", { unit: "K", decimals: 0 });
export const megapascals = (value: number) =>
  formatQuantity(value, "stress", { unit: "MPa", significant: 3, trim: true });
export const forcePerWidth = (value: number) => formatQuantity(value, "forcePerLength", { unit: "N/m" });
export const percent = (share: number) => formatQuantity(share, "fraction", { unit: "%", significant: 2, trim: true });
export const duration = (seconds: number) => formatQuantity(seconds, "time", { significant: 3, trim: true });

export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

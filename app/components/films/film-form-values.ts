import type { FilmKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import { measuredText } from "#app/lib/form-values.ts";
import type { MeasuredText } from "../forms/MeasuredField.tsx";

/** A film as the text of its form. */
export type FilmFormValues = {
  name: string;
  kind: string;
  note: string;
  stressState: string;
  stress: MeasuredText;
  youngsModulus: MeasuredText;
  poissonsRatio: MeasuredText;
  expansion: MeasuredText;
  yieldStress: MeasuredText;
  temperatureLimit: MeasuredText;
};

interface FilmRecord {
  name: string;
  kind: FilmKind;
  note: string;
  stressState: string;
  stress: Measured;
  youngsModulus: Measured;
  poissonsRatio: Measured;
  expansion: Measured;
  yieldStress?: Measured | null;
  temperatureLimit?: Measured | null;
}

export function filmFormValues(film: FilmRecord): FilmFormValues {
  return {
    name: film.name,
    kind: film.kind,
    note: film.note,
    stressState: film.stressState,
    stress: measuredText(film.stress, "stress", { unit: "MPa" }),
    youngsModulus: measuredText(film.youngsModulus, "stress", { unit: "GPa" }),
    poissonsRatio: measuredText(film.poissonsRatio, "number"),
    expansion: measuredText(film.expansion, "expansion", { unit: "ppm/K" }),
    yieldStress: measuredText(film.yieldStress, "stress", { unit: "MPa" }),
    temperatureLimit: measuredText(film.temperatureLimit, "temperature", {
      unit: "°C",
      toleranceDimension: "temperatureDifference",
      toleranceUnit: "K",
    }),
  };
}

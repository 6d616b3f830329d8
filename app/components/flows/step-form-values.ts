import type { Measured } from "#app/engine/measured.ts";
import type { Holding } from "#app/engine/vocabulary.ts";
import { filmCutText, WHOLE, type FilmCutText } from "#app/lib/film-cut.ts";
import { measuredText, quantityText } from "#app/lib/form-values.ts";
import type { StepDetail } from "#app/schemas/flow-view.ts";
import { stepHandlingText, type StepHandlingText } from "./step-handling-values.ts";
import type { MeasuredText } from "../forms/MeasuredField.tsx";

/** A film that a step adds or removes, as the text of its form. */
export type FilmChangeValues = {
  change: string;
  side: string;
  film: string;
  thickness: MeasuredText;
  stress: MeasuredText;
} & FilmCutText;

/** A step as the text of its form. */
export type StepFormValues = {
  title: string;
  kind: string;
  peakTemperature: string;
  holdTime: string;
  equipment: string;
  exposures: string[];
  planned: string;
  siliconAfter: MeasuredText;
  trimWidth: MeasuredText;
  trimDepth: MeasuredText;
  carrier: string;
  bondingMaterial: string;
  bondThickness: MeasuredText;
  groundFaceForce: MeasuredText;
  tape: string;
  films: FilmChangeValues[];
  handling: StepHandlingText;
};

const length = (measured: Measured | null, unit = "µm") => measuredText(measured, "length", { unit });

export function stepFormValues(step: StepDetail): StepFormValues {
  return {
    title: step.title,
    kind: step.kind,
    peakTemperature: quantityText(step.peakTemperature, "temperature", "°C"),
    // Of a profile it is no figure to type.
    holdTime: step.handling.profile ? "" : quantityText(step.holdTime, "time", "min"),
    equipment: step.equipment?.id ?? "",
    exposures: step.exposures,
    planned: step.planned,
    siliconAfter: length(step.siliconAfter),
    trimWidth: length(step.trimWidth, "mm"),
    trimDepth: length(step.trimDepth),
    carrier: step.carrier?.id ?? "",
    bondingMaterial: step.bondingMaterial?.id ?? "",
    bondThickness: length(step.bondThickness),
    groundFaceForce: measuredText(step.groundFaceForce, "forcePerLength", { unit: "N/m" }),
    tape: step.tape?.id ?? "",
    handling: stepHandlingText(step.handling),
    films: step.films.map((film) => ({
      change: film.change,
      side: film.side,
      film: film.film.id,
      ...(film.change === "adds" ? filmCutText(film) : WHOLE),
      thickness: length(film.thickness),
      stress: measuredText(film.ownStress, "stress", { unit: "MPa" }),
    })),
  };
}

/** A new step: at room temperature, held as the one before it. */
export function newStepValues(planned: Holding): Partial<StepFormValues> {
  return { peakTemperature: "25 °C", planned, films: [] };
}

/** A film that is about to be typed. */
export const NEW_FILM: Partial<FilmChangeValues> = { change: "adds", side: "front", ...WHOLE };

import type { FilmKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { SOURCE_KINDS, type Side, type SourceKind } from "#app/engine/vocabulary.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { readFilmCut, type CutFilm } from "./film-cut.ts";
import { readQuantity, toleranceRule, type ReadQuantity } from "./read-quantity.ts";
import { coverRequest } from "./stack-of-request.ts";
import { turnFront } from "./stack-order.ts";
import type { LayerText, StackText } from "./stack-text.ts";

/** A film of the library with what a stack takes from it; SI. */
export interface FilmChoice {
  id: string;
  name: string;
  kind: FilmKind;
  stress: Measured;
  youngsModulus: number;
  poissonsRatio: number;
  expansion: number;
}

export interface SiliconChoice {
  id: string;
  name: string;
  orientation: "100" | "111";
  /** m */
  diameter: number;
  /** as bought, m */
  thickness: number;
}

export interface StackChoices {
  films: readonly FilmChoice[];
  silicon: readonly SiliconChoice[];
}

/** A film of the stack as far as it has been typed. */
export interface DraftLayer {
  side: Side;
  /** the film's name, or which one it is until one is chosen */
  name: string;
  film: FilmChoice | null;
  thickness: number | null;
  thicknessTolerance: number | null;
  thicknessSource: SourceKind;
  /** the stress that counts: this stack's own, else the film's */
  stress: Pick<Measured, "value" | "tolerance" | "source" | "on"> | null;
  /** the area that it covers, and how; null while that is missing */
  cut: CutFilm | null;
  /** what is unusual but not wrong */
  remarks: string[];
}

/** Why there is no estimate yet. */
export interface DraftFault {
  /** name of the field in the form */
  field: string;
  /** what is waited for: 'thickness of Plated copper A' */
  what: string;
  message: string;
}

/** A stack as it is being typed. */
export interface StackDraft {
  silicon: SiliconChoice | null;
  thickness: number | null;
  tolerance: number | null;
  thicknessSource: SourceKind;
  /** top to bottom as the cut shows them */
  layers: DraftLayer[];
  remarks: string[];
  faults: DraftFault[];
  /** what to ask for, once nothing is missing */
  request: EstimateRequest | null;
}

/** Range of the trade for film stress, Pa (common practice, no source); beyond it is unusual, not wrong. */
const USUAL_STRESS = { least: -2000e6, most: 1500e6 };
/** Share of the silicon from which a film is no thin film any more. */
const THIN_FILM = 0.1;

/** Reads a stack from its form's text. Server and browser use the same, so what is drawn first is what stays. */
export function stackDraft(text: StackText, choices: StackChoices): StackDraft {
  const faults: DraftFault[] = [];
  const silicon = choices.silicon.find(({ id }) => id === text.silicon) ?? null;
  if (!silicon) faults.push({ field: "silicon", what: "silicon", message: "Choose the silicon." });
  const note = (field: string, what: string, read: ReadQuantity, mayBeBlank = false) => {
    if (read.ok) return read.value;
    if (!(mayBeBlank && read.blank)) faults.push({ field, what, message: read.message });
    return null;
  };
  const { siliconThickness: typed } = text;
  const thickness = note(
    "siliconThickness.value",
    "remaining silicon",
    readQuantity(typed.value, RULES.siliconThickness),
  );
  const tolerance = note(
    "siliconThickness.tolerance",
    "tolerance of the silicon",
    readQuantity(typed.tolerance, toleranceRule(RULES.siliconThickness)),
    true,
  );
  if (thickness !== null && tolerance !== null && tolerance >= thickness)
    faults.push({
      field: "siliconThickness.tolerance",
      what: "tolerance of the silicon",
      message: "The tolerance is as large as the silicon itself.",
    });
  const layers = text.layers.map((layer, index) => readLayer(layer, index, thickness, choices.films, note));
  layers.forEach(({ name, thickness: film, thicknessTolerance }, index) => {
    if (film !== null && thicknessTolerance !== null && thicknessTolerance >= film)
      faults.push({
        field: `layers[${index}].thickness.tolerance`,
        what: `tolerance of ${name}`,
        message: "The tolerance is as large as the film itself.",
      });
  });
  return {
    silicon,
    thickness,
    tolerance,
    thicknessSource: sourceOf(typed.source),
    layers,
    remarks: thickerThanBought(silicon, thickness),
    faults,
    request:
      faults.length === 0 && silicon && thickness !== null ? requestOf(silicon, thickness, tolerance, layers) : null,
  };
}

type Note = (field: string, what: string, read: ReadQuantity, mayBeBlank?: boolean) => number | null;

function readLayer(
  text: LayerText,
  index: number,
  silicon: number | null,
  films: readonly FilmChoice[],
  note: Note,
): DraftLayer {
  const film = films.find(({ id }) => id === text.film) ?? null;
  const name = film?.name ?? `film ${index + 1} from the top`;
  const at = `layers[${index}]`;
  if (!film) note(`${at}.film`, name, { ok: false, blank: true, message: "Choose a film." });
  const thickness = note(
    `${at}.thickness.value`,
    `thickness of ${name}`,
    readQuantity(text.thickness.value, RULES.filmThickness),
  );
  const thicknessTolerance = note(
    `${at}.thickness.tolerance`,
    `tolerance of ${name}`,
    readQuantity(text.thickness.tolerance, toleranceRule(RULES.filmThickness)),
    true,
  );
  const cut = readFilmCut(text, (part, read) => note(`${at}.${part}`, `${CUT_PARTS[part]} of ${name}`, read));
  const own = readQuantity(text.stress.value, RULES.stress);
  note(`${at}.stress.value`, `stress of ${name}`, own, true);
  const stressTolerance = note(
    `${at}.stress.tolerance`,
    `tolerance of ${name}`,
    readQuantity(text.stress.tolerance, toleranceRule(RULES.stress)),
    true,
  );
  const stress = own.ok
    ? {
        value: own.value,
        tolerance: stressTolerance,
        source: sourceOf(text.stress.source),
        on: text.stress.on || null,
      }
    : own.blank
      ? (film?.stress ?? null)
      : null;
  return {
    side: text.side,
    name,
    film,
    thickness,
    thicknessTolerance,
    thicknessSource: sourceOf(text.thickness.source),
    stress,
    cut,
    remarks: layerRemarks(stress?.value ?? 0, thickness, silicon),
  };
}

const CUT_PARTS = { coverage: "area coverage", lineWidth: "line width", lineDirection: "direction of the lines" };

/** Where a value comes from; what nobody says is assumed. */
const sourceOf = (text: string | undefined): SourceKind => SOURCE_KINDS.find((kind) => kind === text) ?? "assumed";

function layerRemarks(stress: number, thickness: number | null, silicon: number | null): string[] {
  const remarks: string[] = [];
  if (stress < USUAL_STRESS.least || stress > USUAL_STRESS.most)
    remarks.push("Stress outside −2000 to +1500\u00A0MPa, the range of the trade (common practice, no source)");
  if (thickness !== null && silicon !== null && thickness > THIN_FILM * silicon)
    remarks.push("Thicker than a tenth of the silicon: no thin film, so Stoney’s formula is off");
  return remarks;
}

function thickerThanBought(silicon: SiliconChoice | null, thickness: number | null): string[] {
  if (!silicon || thickness === null || thickness <= silicon.thickness * (1 + 1e-9)) return [];
  return [`Thicker than this wafer is bought, ${formatQuantity(silicon.thickness, "length", { unit: "µm" })}`];
}

function requestOf(
  silicon: SiliconChoice,
  thickness: number,
  tolerance: number | null,
  layers: readonly DraftLayer[],
): EstimateRequest {
  return {
    wafer: {
      diameter_m: silicon.diameter,
      thickness_m: thickness,
      ...(tolerance !== null && { thickness_tolerance_m: tolerance }),
      orientation: silicon.orientation,
    },
    films: turnFront(layers).flatMap(({ side, film, thickness: filmThickness, thicknessTolerance, stress, cut }) =>
      film && stress && filmThickness !== null && cut !== null
        ? [
            {
              side,
              thickness_m: filmThickness,
              stress_Pa: stress.value,
              youngs_modulus_Pa: film.youngsModulus,
              poissons_ratio: film.poissonsRatio,
              cte_per_K: film.expansion,
              ...coverRequest(cut),
              ...(thicknessTolerance !== null && { thickness_tolerance_m: thicknessTolerance }),
              ...(stress.tolerance !== null && { stress_tolerance_Pa: stress.tolerance }),
            },
          ]
        : [],
    ),
  };
}

/** Points of the curve of warp against thickness: enough that its kink at the curling limit is sharp. */
const CURVE_POINTS = 120;
/** Thin end of the curve, m. */
const THIN_END = 20e-6;

/**
 * The request that a panel is made of: with working and with the curve, from 20 µm (or half of what is chosen, if that is thinner)
 * up to the wafer as bought. At `temperature`, K, when it is not 25 °C.
 */
export function panelRequest(
  request: EstimateRequest,
  { boughtThickness, temperature }: { boughtThickness: number; temperature: number | null },
): EstimateRequest {
  const { thickness_m } = request.wafer;
  return {
    ...request,
    ...(temperature !== null && { temperature_K: temperature }),
    sweep: {
      from_m: Math.max(RULES.siliconThickness.range.least, Math.min(THIN_END, thickness_m / 2)),
      to_m: Math.max(boughtThickness, thickness_m),
      points: CURVE_POINTS,
    },
    ...(temperature === null && { working: true }),
  };
}

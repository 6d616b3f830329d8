import { applyStiffness, isotropicStiffness, siliconPlaneStiffness } from "../directional/plane-stiffness.ts";
import type { DirectionalLayer } from "../directional/layer.ts";
import { EngineInputError } from "../errors.ts";
import { requireCurvature, requireWithin } from "../inputs.ts";
import { checkLayer, type Layer } from "../laminate/layer.ts";
import { siliconPlateConstants, type PlateConstants } from "../silicon/plane-constants.ts";
import type { Orientation } from "../silicon/orientation.ts";
import { bowFromCurvature } from "../stoney/bow.ts";
import type { FlowInput, IncomingShape } from "./model.ts";
import type { StackEntry } from "./stack-entry.ts";

/** Depth over which a ground face carries its force, m: subsurface damage of a ground wafer (Marks 2014, `marks-2014`). */
const GROUND_FACE_DEPTH = 0.2e-6;

/** Depth at a face in which an incoming curvature is kept as a free strain, m: part of the silicon, thin against any wafer. */
const SKIN = 0.1e-6;

interface Pair {
  x: number;
  y: number;
}

/** What a wafer came in with: the moment of its films over the plate's stiffness, and the crystal's own curvature. */
export interface Incoming {
  /** curvature that the films gave it, 1/m, at `thickness` (m) */
  film: Pair;
  crystal: Pair;
  thickness: number;
}

/**
 * The incoming shape split into its parts; null for a wafer that came flat.
 * @throws EngineInputError when a curvature or the share is out of range
 */
export function incomingParts({ incoming, thickness }: FlowInput["wafer"]): Incoming | null {
  if (!incoming) return null;
  const x = requireCurvature("wafer.incoming.curvature.x", incoming.curvature.x.value);
  const y = requireCurvature("wafer.incoming.curvature.y", incoming.curvature.y.value);
  if (x === 0 && y === 0) return null;
  const share = requireWithin("wafer.incoming.filmShare", incoming.filmShare?.value ?? 1, 0, 1, "1");
  return {
    film: { x: x * share, y: y * share },
    crystal: { x: x * (1 - share), y: y * (1 - share) },
    thickness: thickness.value,
  };
}

/**
 * An incoming shape from standard bows, m, centre above the rim positive with the device side up, along a diameter in x and one
 * in y: κ = −2 bow/R², small bows.
 */
export function incomingFromBows(i: {
  radius: number;
  bowX: IncomingShape["curvature"]["x"];
  bowY: IncomingShape["curvature"]["y"];
  filmShare: IncomingShape["filmShare"];
}): IncomingShape {
  const perCurvature = bowFromCurvature({ curvature: 1, radius: i.radius });
  const curvature = (bow: typeof i.bowX) => ({
    ...bow,
    value: bow.value === 0 ? 0 : -bow.value / perCurvature,
    tolerance: bow.tolerance === null ? null : bow.tolerance / perCurvature,
  });
  return { curvature: { x: curvature(i.bowX), y: curvature(i.bowY) }, filmShare: i.filmShare };
}

const plateConstants = new Map<Orientation, PlateConstants>();

/** `siliconPlateConstants` at 25 °C, worked out once for each orientation. */
export function waferConstants(orientation: Orientation): PlateConstants {
  const known = plateConstants.get(orientation);
  if (known) return known;
  const made = siliconPlateConstants(orientation);
  plateConstants.set(orientation, made);
  return made;
}

/** Part of the silicon with its free strain in x and y besides that of temperature. */
interface Slice {
  thickness: number;
  strain: Pair;
  /** biaxial stress that the slice carries by itself, Pa */
  stress: number;
  field: string;
}

function sliceEntry(orientation: Orientation, { thickness, strain, stress, field }: Slice): StackEntry {
  const plate = waferConstants(orientation);
  const modulus = plate.youngsModulus / (1 - plate.poissonsRatio);
  const stated: Layer = {
    ...plate,
    thickness,
    cte: "silicon",
    stress: stress - (modulus * (strain.x + strain.y)) / 2,
  };
  const cubic = orientation === "100";
  const stiffness = cubic ? siliconPlaneStiffness("110") : isotropicStiffness(plate.youngsModulus, plate.poissonsRatio);
  const relief = applyStiffness(stiffness, { ...strain, xy: 0 });
  const pull = { x: stress - relief.x, y: stress - relief.y };
  const directional: DirectionalLayer = cubic
    ? { silicon: { direction: "110" }, thickness, cte: "silicon", stress: pull }
    : { ...plate, thickness, cte: "silicon", stress: pull };
  return { stated, directional, field, layer: checkLayer(stated, field) };
}

const NO_STRAIN: Pair = { x: 0, y: 0 };

/**
 * The silicon from its back face up. A ground face carries its force (N/m) over the damaged depth, which is part of the
 * silicon, so it takes nothing from the stiffness and adds nothing to the thickness. An incoming curvature is kept in skins at
 * the faces, as strains whose moment about the wafer's middle is that of its films, M h₀² κ/6 times the thickness it
 * has now over two, or the moment of the crystal's own curvature, M h³ κ/12, whatever it has been thinned to.
 */
export function siliconEntries(
  orientation: Orientation,
  thickness: number,
  groundFaceForce: number,
  incoming: Incoming | null,
): StackEntry[] {
  if (groundFaceForce === 0 && !incoming)
    return [sliceEntry(orientation, { thickness, strain: NO_STRAIN, stress: 0, field: "silicon" })];
  const damaged = groundFaceForce === 0 ? 0 : Math.min(GROUND_FACE_DEPTH, thickness / 4);
  const skin = incoming ? Math.min(SKIN, thickness / 8) : 0;
  const slices: Slice[] = [];
  const put = (depth: number, strain: Pair, stress: number, field: string) => {
    if (depth > 0) slices.push({ thickness: depth, strain, stress, field });
  };
  const { front, back } = incoming ? skinStrains(incoming, thickness, skin) : { front: NO_STRAIN, back: NO_STRAIN };
  put(skin, back, 0, "incoming");
  put(damaged, NO_STRAIN, damaged > 0 ? groundFaceForce / damaged : 0, "groundFace");
  put(thickness - damaged - 2 * skin, NO_STRAIN, 0, "silicon");
  put(skin, front, 0, "incoming");
  if (!(thickness > 0)) throw new EngineInputError("silicon", "must have a thickness", "> 0 m");
  return slices.map((slice) => sliceEntry(orientation, slice));
}

function skinStrains({ film, crystal, thickness: before }: Incoming, thickness: number, skin: number) {
  const arm = skin * (thickness - skin);
  const byFilm = (before * before * thickness) / (6 * arm);
  const byCrystal = thickness ** 3 / (12 * arm);
  const along = (axis: "x" | "y", sign: number) =>
    -(sign > 0 ? film[axis] * byFilm : 0) - sign * crystal[axis] * byCrystal;
  return { front: { x: along("x", 1), y: along("y", 1) }, back: { x: along("x", -1), y: along("y", -1) } };
}

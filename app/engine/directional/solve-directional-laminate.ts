import { EngineInputError } from "../errors.ts";
import { freeStrain } from "../laminate/free-strain.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { findBase } from "../laminate/placed-layers.ts";
import { factor, type Factor } from "./factor.ts";
import { checkDirectionalLayer, type DirectionalLayer } from "./layer.ts";
import {
  addStiffness,
  addTensor,
  applyStiffness,
  scaleStiffness,
  type PlaneStiffness,
  type PlaneTensor,
} from "./plane-stiffness.ts";

export interface DirectionalLaminateResult {
  /** w_xx, 1/m, positive when the top face (device side) is concave along x. */
  curvatureX: number;
  /** w_yy, 1/m. */
  curvatureY: number;
  /** w_xy, 1/m: with it the surface is w = κ_x x²/2 + κ_y y²/2 + twist x y. */
  twist: number;
  /** The same surface along its own axes: the curvature of larger size, the other one, and the angle of the first from x (rad). */
  principal: { major: number; minor: number; angle: number };
  /** Strain of the stack's mid-plane against the flat base at 298.15 K; `xy` is the engineering shear strain. */
  midplaneStrain: PlaneTensor;
  /** Strain of the stack held flat and free to slide. */
  flatStrain: PlaneTensor;
  /** Stress in each layer itself while the stack is held flat and free to slide, the same through the layer, Pa. */
  flatStress: PlaneTensor[];
  /** Free strain of each layer. */
  freeStrain: PlaneTensor[];
  /** Stress in each layer itself at its lower face, Pa; in a patterned film the mean over its parts. */
  stressBottom: PlaneTensor[];
  /** The same at its upper face. */
  stressTop: PlaneTensor[];
  /** Mean of the two. */
  meanStress: PlaneTensor[];
  /** A, B and D about the mid-plane: N/m, N and N·m. */
  stretchingStiffness: PlaneStiffness;
  couplingStiffness: PlaneStiffness;
  bendingStiffness: PlaneStiffness;
  /** Bending stiffness with the stack free to stretch, D − B A⁻¹ B, N·m: what a moment bends. */
  freeBendingStiffness: PlaneStiffness;
  /** sqrt(12 D/A) of the biaxial parts, m, as in `solveLaminate`. */
  effectiveThickness: number;
}

/**
 * Curvatures and stresses of a stack of layers, bottom to top, whose two directions differ: classical laminate theory with the
 * full 3×3 stretching, coupling and bending stiffness. Perfect bonds, no outside forces, at `temperature` (K, default 298.15).
 *
 * A layer is isotropic, cut into lines or islands if it has a `pattern`, or silicon (001) in any direction; its stress may
 * differ along x and y. The free strain follows the one rule of `layerFreeStrain` in both directions, stress going through the
 * layer's compliance; a pattern changes the stiffness alone, and its force with it. Zero of strain and base layer are those of
 * `solveLaminate`, to which this is equal for isotropic layers of equal stress within rounding (1e-12).
 *
 * Small slopes; the stack is thin against its width. A strip narrower than some thicknesses, or a free wafer past the range of
 * small deflections, takes another shape. Bad input throws `EngineInputError` naming the layer; so does a stack without
 * stiffness in some direction, such as narrow lines alone.
 *
 * Source: Jones 1999, chapter 4; Townsend, Barnett and Brunner 1987 for equal directions.
 */
export function solveDirectionalLaminate(
  layersBottomToTop: readonly DirectionalLayer[],
  o: { temperature?: number } = {},
): DirectionalLaminateResult {
  const layers = place(layersBottomToTop, o.temperature ?? ROOM_TEMPERATURE);
  const stretching = total(layers, (l) => l.membrane);
  const stretchingFactor = requireStiff(stretching);
  const biaxial = layers.reduce((sum, l) => sum + biaxialPart(l.membrane), 0);
  // Heights from the neutral plane of equal strains, strains from the mean one: nothing large cancels for a thin film.
  const neutral = layers.reduce((sum, l) => sum + biaxialPart(l.membrane) * l.centre, 0) / biaxial;
  const flatStrain = stretchingFactor.solve(totalTensor(layers, (l) => applyStiffness(l.membrane, l.freeStrain)));
  const height = (l: PlacedLayer) => l.centre - neutral;
  const coupling = total(layers, (l) => scaleStiffness(l.membrane, height(l)));
  const bending = total(layers, (l) => scaleStiffness(l.membrane, l.thickness ** 2 / 12 + height(l) ** 2));
  const moment = totalTensor(layers, (l) =>
    applyStiffness(scaleStiffness(l.membrane, height(l)), addTensor(l.freeStrain, flatStrain, -1)),
  );
  const free = freeBending(bending, coupling, stretchingFactor);
  const perHeight = requireStiff(free).solve(moment);
  const shift = stretchingFactor.solve(applyStiffness(coupling, perHeight));
  const neutralStrain = addTensor(flatStrain, shift, -1);
  const strainAt = (z: number) => addTensor(neutralStrain, perHeight, z - neutral);
  const stressAt = (l: PlacedLayer, z: number) => applyStiffness(l.stiffness, addTensor(strainAt(z), l.freeStrain, -1));
  const [curvatureX, curvatureY, twist] = [turned(perHeight.x), turned(perHeight.y), turned(perHeight.xy / 2)];
  return {
    curvatureX,
    curvatureY,
    twist,
    principal: principalCurvatures(curvatureX, curvatureY, twist),
    midplaneStrain: strainAt(0),
    flatStrain,
    flatStress: layers.map((l) => applyStiffness(l.stiffness, addTensor(flatStrain, l.freeStrain, -1))),
    freeStrain: layers.map((l) => l.freeStrain),
    stressBottom: layers.map((l) => stressAt(l, l.centre - l.thickness / 2)),
    stressTop: layers.map((l) => stressAt(l, l.centre + l.thickness / 2)),
    meanStress: layers.map((l) => stressAt(l, l.centre)),
    stretchingStiffness: stretching,
    couplingStiffness: total(layers, (l) => scaleStiffness(l.membrane, l.centre)),
    bendingStiffness: total(layers, (l) => scaleStiffness(l.membrane, l.thickness ** 2 / 12 + l.centre ** 2)),
    freeBendingStiffness: free,
    effectiveThickness: Math.sqrt((12 * biaxialPart(free)) / biaxial),
  };
}

/** Larger and smaller curvature of w = κ_x x²/2 + κ_y y²/2 + twist x y, 1/m, and the angle of the first from x, rad. */
export function principalCurvatures(curvatureX: number, curvatureY: number, twist: number) {
  const mean = (curvatureX + curvatureY) / 2;
  const half = Math.hypot((curvatureX - curvatureY) / 2, twist);
  const [major, minor] = mean >= 0 ? [mean + half, mean - half] : [mean - half, mean + half];
  // The axis of the algebraically larger curvature, or the one across it.
  const axis = Math.atan2(2 * twist, curvatureX - curvatureY) / 2;
  return { major, minor, angle: mean >= 0 || half === 0 ? axis : axis > 0 ? axis - Math.PI / 2 : axis + Math.PI / 2 };
}

interface PlacedLayer {
  thickness: number;
  /** Height of the layer's middle over the mid-plane of the stack, m. */
  centre: number;
  /** Stress per strain in the layer itself, Pa. */
  stiffness: PlaneStiffness;
  /** Stiffness times thickness times coverage, N/m. */
  membrane: PlaneStiffness;
  freeStrain: PlaneTensor;
}

function place(layersBottomToTop: readonly DirectionalLayer[], temperature: number): PlacedLayer[] {
  const checked = layersBottomToTop.map((layer, n) => checkDirectionalLayer(layer, `layers[${n}]`));
  const named = checked.map(({ base }, n) => ({ layer: base, field: `layers[${n}]` }));
  const base = findBase(named);
  const whole = named.reduce((sum, { layer }) => sum + layer.thickness, 0);
  let below = 0;
  return checked.map(({ base: layer, stiffness, coverage, stressStrain }, n) => {
    const centre = below + layer.thickness / 2 - whole / 2;
    below += layer.thickness;
    // Equal in both directions: what temperature and yielding do.
    const equal = freeStrain({ layer, field: `layers[${n}]` }, base, temperature);
    return {
      thickness: layer.thickness,
      centre,
      stiffness,
      membrane: scaleStiffness(stiffness, coverage * layer.thickness),
      freeStrain: addTensor({ x: equal, y: equal, xy: 0 }, stressStrain),
    };
  });
}

/** Force per equal strain in both directions, halved: E/(1 − ν) for an isotropic layer. */
function biaxialPart(q: PlaneStiffness): number {
  return (q.xx + 2 * q.xy + q.yy) / 2;
}

/** D − B A⁻¹ B. */
function freeBending(d: PlaneStiffness, b: PlaneStiffness, a: Factor): PlaneStiffness {
  const x = applyStiffness(b, a.solve({ x: b.xx, y: b.xy, xy: b.xs }));
  const y = applyStiffness(b, a.solve({ x: b.xy, y: b.yy, xy: b.ys }));
  const s = applyStiffness(b, a.solve({ x: b.xs, y: b.ys, xy: b.ss }));
  return { xx: d.xx - x.x, xy: d.xy - y.x, yy: d.yy - y.y, xs: d.xs - s.x, ys: d.ys - s.y, ss: d.ss - s.xy };
}

function requireStiff(stiffness: PlaneStiffness): Factor {
  const split = factor(stiffness);
  if (split === null) {
    throw new EngineInputError("layers", "leave the stack without stiffness in some direction of the plane");
  }
  return split;
}

const NO_STIFFNESS: PlaneStiffness = { xx: 0, xy: 0, yy: 0, xs: 0, ys: 0, ss: 0 };

function total(layers: readonly PlacedLayer[], of: (l: PlacedLayer) => PlaneStiffness): PlaneStiffness {
  return layers.reduce((sum, l) => addStiffness(sum, of(l)), NO_STIFFNESS);
}

function totalTensor(layers: readonly PlacedLayer[], of: (l: PlacedLayer) => PlaneTensor): PlaneTensor {
  return layers.reduce((sum, l) => addTensor(sum, of(l)), { x: 0, y: 0, xy: 0 });
}

/** Strain that grows upward closes a dome; never negative zero. */
function turned(perHeight: number): number {
  return perHeight === 0 ? 0 : -perHeight;
}

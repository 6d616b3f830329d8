import { EngineInputError } from "#app/engine/errors.ts";
import { columnsOf, type ScanColumns } from "#app/engine/profile/columns.ts";
import { fitScan } from "#app/engine/profile/fit-scan.ts";
import { fitSurface } from "#app/engine/profile/map/fit-surface.ts";
import {
  shapeFigures,
  type ShapeFigure,
  type ShapeFigures,
  type ShapeFiguresInput,
} from "#app/engine/profile/map/shape-figures.ts";
import type { Surface } from "#app/engine/profile/map/surface.ts";
import { matchScans } from "#app/engine/profile/match-scans.ts";
import { profilePoints } from "#app/lib/scan-reading/profile-points.ts";
import { bowFromCurvature } from "#app/engine/stoney/bow.ts";
import { shortCitation } from "#app/lib/short-citation.ts";
import type { ShapeView } from "#app/schemas/film-analysis.ts";
import type { FilmSubject, PlacedPair, PlacedPoints } from "./pair-points.ts";
import { toolOfMean } from "./budget.ts";
import { mapView } from "./map-view.ts";

type Line = ScanColumns & { azimuth: number };
interface Points {
  azimuth: number;
  pre: PlacedPoints;
  post: PlacedPoints;
}

/** What the robust fit leaves out over less than this share of a scan is a spike; more of it may be the wafer's own shape. */
const SPIKE = 0.05;
/** Points of a scan that a surface is made of: the fit takes no more either. */
const DRAWN_FROM = 2000;

/** A shape with the input of its figures, for the workings. */
export interface Shape {
  view: ShapeView;
  input: ShapeFiguresInput;
  figures: ShapeFigures;
}

/**
 * The wafer before its film, after it, and what the film changed, each as a surface through the scans; or why there is none. The change
 * is fitted to the scans' differences, so the weight of the wafer is not in it.
 */
export function shapesOf(
  pairs: readonly PlacedPair[],
  subject: FilmSubject,
): { why: string } | { shapes: Shape[]; remarks: string[] } {
  const { diameter, edgeExclusion } = subject.parameters;
  const lines = pairs.flatMap(({ azimuth, points }): Points[] =>
    azimuth === null || points === null ? [] : [{ azimuth, ...points }],
  );
  if (lines.length < 3)
    return { why: "A surface takes scans along three azimuths, 60 degrees apart, with their azimuths given." };
  const reach = Math.min(...lines.flatMap(({ pre, post }) => [halfLength(pre), halfLength(post)]));
  const exclusion = Math.max(edgeExclusion, diameter / 2 - reach);
  if (exclusion > diameter / 4)
    return { why: "The scans cover less than half of the wafer: a surface would be a guess beyond them." };
  try {
    const fit = (scans: Line[]) => fitSurface({ scans, radius: diameter / 2, edgeExclusion: exclusion });
    const thickness = thicknessSurface(subject, exclusion);
    const tool = toolOfMean(pairs);
    const shape = (of: ShapeView["of"], surface: Surface): Shape => shapeOf(of, surface, { subject, thickness, tool });
    return remarkedOnce(tool !== null, [
      shape("after the film", fit(lines.map(({ azimuth, post }) => ({ azimuth, ...withoutSpikes(post) })))),
      shape("before the film", fit(lines.map(({ azimuth, pre }) => ({ azimuth, ...withoutSpikes(pre) })))),
      shape("change by the film", fit(lines.map((line) => ({ azimuth: line.azimuth, ...difference(line) })))),
    ]);
  } catch (error) {
    if (error instanceof EngineInputError) return { why: `The scans ${error.reason}.` };
    throw error;
  }
}

/** What holds for all shapes is said once. */
function remarkedOnce(studied: boolean, shapes: Shape[]): { shapes: Shape[]; remarks: string[] } {
  const [first] = shapes;
  const common = (first?.view.remarks ?? []).filter((remark) =>
    shapes.every(({ view }) => view.remarks.includes(remark)),
  );
  return {
    remarks: [studied ? WITH_TOOL : WITHOUT_TOOL, ...common],
    shapes: shapes.map((shape) => ({
      ...shape,
      view: { ...shape.view, remarks: shape.view.remarks.filter((remark) => !common.includes(remark)) },
    })),
  };
}

const WITH_TOOL =
  "Each ± (k = 2) holds the scatter about the surface, what the instrument repeats within, and, but for the change, how far it may be off.";
const WITHOUT_TOOL =
  "Each ± (k = 2) holds the scatter about the surface alone: no repeatability study of the instrument is known.";

function halfLength({ x }: ScanColumns): number {
  return Math.min(-(x[0] ?? 0), x[x.length - 1] ?? 0);
}

function difference({ pre, post }: Points): { x: Float64Array; z: Float64Array } {
  const { x, before, after } = matchScans(pre, post);
  return withoutSpikes({ x, z: after.map((height, n) => height - (before[n] ?? 0)) });
}

function withoutSpikes(whole: ScanColumns): { x: Float64Array; z: Float64Array } {
  const scan = columnsOf(
    profilePoints(
      {
        x: Float64Array.from(whole.x),
        z: Float64Array.from(whole.z),
        from: whole.x[0] ?? 0,
        to: whole.x[whole.x.length - 1] ?? 0,
      },
      DRAWN_FROM,
    ),
  );
  const fit = fitScan(scan, { edgeExclusion: 0, robust: true });
  const spikes = fit.runs.filter(({ from, to }) => to - from < SPIKE * 2 * fit.halfWidth);
  const keep = (at: number) => spikes.every(({ from, to }) => at < from || at > to);
  return { x: scan.x.filter(keep), z: scan.z.filter((_, n) => keep(scan.x[n] ?? 0)) };
}

function thicknessSurface({ thicknessSites, parameters }: FilmSubject, edgeExclusion: number): Surface | null {
  if (!thicknessSites) return null;
  try {
    return fitSurface({ sites: thicknessSites, radius: parameters.diameter / 2, edgeExclusion, order: 2 });
  } catch (error) {
    // Too few sites tell no surface; the figures say that there is no map.
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}

interface About {
  subject: FilmSubject;
  thickness: Surface | null;
  tool: ReturnType<typeof toolOfMean>;
}

/** Share of the sagitta over the fitted disk that a figure of a parabola is. */
const OF_SAGITTA: Record<ShapeFigure["name"], number> = { bow: 1, "bow, best fit": 0.5, warp: 1, sori: 1 };

function shapeOf(of: ShapeView["of"], surface: Surface, { subject: { parameters }, thickness, tool }: About): Shape {
  const radius = parameters.diameter / 2;
  const change = of === "change by the film";
  const input: ShapeFiguresInput = {
    surface,
    radius,
    waferThickness: parameters.siliconThickness,
    // Thickness drops out of a difference: what bends is the same surface before and after.
    thickness: change ? null : thickness,
    of: change ? "median surface" : "front surface",
    gravity: change ? "subtracted" : "not stated",
  };
  const figures = shapeFigures(input);
  const { bow, bowBestFit, warp, sori, remarks } = figures;
  const curvature = (change ? tool?.change : tool?.alone) ?? 0;
  const byTool = bowFromCurvature({ curvature, radius: surface.radius });
  return {
    input,
    figures,
    view: {
      of,
      figures: [bow, bowBestFit, warp, ...(change ? [] : [sori])].map(
        ({ name, value, standardUncertainty, definition, source }) => ({
          name,
          value: { value, uncertainty: 2 * Math.hypot(standardUncertainty, OF_SAGITTA[name] * byTool) },
          definition,
          source: shortCitation(source),
        }),
      ),
      map: mapView(surface, radius),
      rms: surface.rms,
      remarks: change ? remarks.filter((remark) => !remark.startsWith("No thickness map")) : remarks,
    },
  };
}

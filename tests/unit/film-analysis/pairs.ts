import { MONITOR_PARAMETERS } from "#app/db/seeders/demo-monitor.ts";
import { curvatureAlong } from "#app/engine/profile/azimuths.ts";
import { columnsOf } from "#app/engine/profile/columns.ts";
import type { FilmSubject, KnownTool, PlacedPair } from "#app/lib/film-analysis/pair-points.ts";
import type { FileReading, ScanParameters } from "#app/schemas/scan-result.ts";
import { scanResult } from "#app/services/scan-result-of.ts";
import { draws } from "#tests/engine/unit/profile/honest-scan.ts";

export interface Bend {
  x: number;
  y: number;
  twist: number;
}

/** Curvature the same in all directions, 1/m. */
export const even = (curvature: number): Bend => ({ x: curvature, y: curvature, twist: 0 });

const READING: FileReading = {
  rows: 381,
  used: 381,
  columns: 2,
  heading: null,
  delimiter: ",",
  from: -0.095,
  to: 0.095,
  skipped: [],
  skippedInAll: 0,
};

interface Options {
  before?: Bend;
  degrees?: readonly number[];
  parameters?: Partial<ScanParameters>;
  tool?: KnownTool | null;
  sameTool?: boolean;
  /** height added at a position of the scans after the film, m */
  disturb?: (x: number) => number;
}

/** Scans of a wafer with 30 nm of scatter, bent as stated before its film, and by the film as `change` says. */
export function pairsOf(change: Bend, options: Options = {}): PlacedPair[] {
  const { before = even(0.0008), degrees = [0, 60, 120], tool = null, sameTool = true, disturb = () => 0 } = options;
  const parameters = { ...MONITOR_PARAMETERS, ...options.parameters };
  const half = 0.95 * (parameters.diameter / 2);
  return degrees.map((angle, line) => {
    const azimuth = (angle * Math.PI) / 180;
    const profile = (bend: number, stream: number, added: (x: number) => number) => {
      const noise = draws(11, 10 * line + stream).normals(381);
      return Array.from(noise, (scatter, n) => {
        const x = -half + (2 * half * n) / 380;
        return { x, z: (bend * x * x) / 2 + 2e-5 * x + 30e-9 * scatter + added(x) };
      });
    };
    const own = curvatureAlong(before, azimuth);
    const pre = profile(own, 1, () => 0);
    const post = profile(own + curvatureAlong(change, azimuth), 2, disturb);
    const subject = { program: "", label: "", film: null, ...parameters };
    return {
      id: `scan-${angle}`,
      label: `M-1, ${angle}°`,
      azimuth,
      points: { pre: { ...columnsOf(pre), day: null }, post: { ...columnsOf(post), day: null } },
      result: scanResult(
        subject,
        { points: columnsOf(pre), reading: READING },
        { points: columnsOf(post), reading: READING },
      ),
      sameTool,
      tool,
    };
  });
}

export function subjectOf(changes: Partial<FilmSubject> = {}): FilmSubject {
  return {
    parameters: MONITOR_PARAMETERS,
    film: null,
    usedAt: null,
    measuredThickness: null,
    thicknessSites: null,
    reduced: null,
    ...changes,
  };
}

export const STUDIED: KnownTool = {
  name: "Stylus 1",
  repeatability: { standardUncertainty: 5e-5, degreesOfFreedom: 9 },
  forTwo: 5.8e-5,
  offset: { standardUncertainty: 1e-4 },
};

export const TODAY = { year: 2026, month: 12, day: 1 };

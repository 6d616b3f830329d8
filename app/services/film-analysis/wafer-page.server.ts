import type { EntityManager } from "@mikro-orm/postgresql";
import { Scan } from "#app/db/entities/scan.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import type { FilmChoice, FilmOnWafer, ScanLine, WaferPage } from "#app/schemas/wafer-page.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { analyseScans, FOR_ANALYSIS } from "./analyse-scans.server.ts";

/**
 * A wafer with the films that were measured on it, and what the scans of one of them say together: that of `key`, else the newest.
 * @throws 404 for a wafer that is not there or of another program
 */
export async function getWaferPage(scope: ActorScope, id: string | undefined, key: string | null): Promise<WaferPage> {
  return inScope(scope, async (em) => {
    const wafer = await em.findOne(Wafer, { id: idFrom(id, "wafer") }, { populate: ["program", "lot"] });
    if (!wafer) throw notFound("wafer");
    requireInProgram(scope, "see the work", wafer.program.id, "wafer");
    const scans = await scansOf(em, wafer.id);
    const keys = [...new Set(scans.map(filmKey))];
    const groups = keys.map((one) => [one, scans.filter((scan) => filmKey(scan) === one)] as const);
    const [chosenKey, chosen = []] = groups.find(([one]) => one === key) ?? groups[0] ?? ["", []];
    const [newest, ...others] = chosen;
    return {
      id: wafer.id,
      name: wafer.name,
      slot: wafer.slot ?? null,
      lot: wafer.lot ? { id: wafer.lot.id, name: wafer.lot.name } : null,
      program: { name: wafer.program.name, slug: wafer.program.slug },
      films: groups.flatMap(([one, [first, ...rest]]) => (first ? [choiceOf(one, first, 1 + rest.length)] : [])),
      film: newest ? await filmOnWafer(em, chosenKey, [newest, ...others]) : null,
    };
  });
}

async function scansOf(em: EntityManager, wafer: string) {
  return em.find(
    Scan,
    { wafer },
    { populate: [...FOR_ANALYSIS, "createdBy"], orderBy: [{ createdAt: "desc" }, { id: "asc" }] },
  );
}

type LoadedScan = Awaited<ReturnType<typeof scansOf>>[number];

/** Scans of one film of one thickness belong together. */
const filmKey = ({ film, parameters }: LoadedScan) => `${film?.id ?? "none"}-${parameters.filmThickness}`;

function choiceOf(key: string, { film, parameters }: LoadedScan, scans: number): FilmChoice {
  return { key, name: film?.name ?? "film not named", thickness: parameters.filmThickness, scans };
}

async function filmOnWafer(em: EntityManager, key: string, scans: [LoadedScan, ...LoadedScan[]]): Promise<FilmOnWafer> {
  const [newest] = scans;
  return {
    key,
    name: newest.film?.name ?? null,
    filmId: newest.film?.id ?? null,
    parameters: newest.parameters,
    scans: scans.map(scanLine).sort((a, b) => (a.azimuth ?? -1) - (b.azimuth ?? -1)),
    remarks: remarksOn(scans),
    ...(await analyseScans(em, scans as [Scan, ...Scan[]])),
  };
}

function scanLine(scan: LoadedScan): ScanLine {
  const { curvatureChange, curvatureUncertainty, stress, stressUncertainty } = scan.result.get();
  return {
    id: scan.id,
    label: scan.label,
    azimuth: scan.azimuth ?? null,
    change: { value: curvatureChange, uncertainty: 2 * curvatureUncertainty },
    stress: { value: stress, uncertainty: 2 * stressUncertainty },
    instrument: scan.instrument?.name ?? (scan.instrumentName || null),
    createdAt: scan.createdAt.toISOString(),
    createdBy: scan.createdBy.name,
  };
}

function remarksOn(scans: readonly LoadedScan[]): string[] {
  const nameless = scans.filter(({ azimuth }) => azimuth === null || azimuth === undefined).length;
  const differ = (of: (scan: LoadedScan) => unknown) => new Set(scans.map(of)).size > 1;
  return [
    ...(nameless > 0 && scans.length > 1
      ? [
          `${nameless === 1 ? "One scan has" : `${nameless} scans have`} no azimuth: taken as along the notch, and left out of the map.`,
        ]
      : []),
    ...(differ(({ parameters }) => parameters.siliconThickness) || differ(({ parameters }) => parameters.diameter)
      ? ["The scans were entered with different wafers’ thicknesses or diameters; those of the newest count."]
      : []),
  ];
}

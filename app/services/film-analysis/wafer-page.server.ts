import type { EntityManager } from "@mikro-orm/postgresql";
import { Scan } from "#app/db/entities/scan.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { matchScans } from "#app/engine/profile/match-scans.ts";
import type { KeptProfile } from "#app/lib/reading-csv.ts";
import type { FilmChoice, FilmOnWafer, ScanLine, WaferPage } from "#app/schemas/wafer-page.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { analyseScans, FOR_ANALYSIS } from "./analyse-scans.server.ts";
import { scanOnWafer, type KnownTools } from "./scan-on-wafer.server.ts";

/**
 * A wafer with the films that were measured on it, and what the scans of one of them say together: that of `key`, else the newest.
 * @throws 404 for a wafer that is not there or of another program
 */
export async function getWaferPage(scope: ActorScope, id: string | undefined, key: string | null): Promise<WaferPage> {
  return inScope(scope, async (em) => {
    const { wafer, groups, chosen } = await chosenFilm(em, scope, id, key);
    return {
      id: wafer.id,
      name: wafer.name,
      slot: wafer.slot ?? null,
      lot: wafer.lot ? { id: wafer.lot.id, name: wafer.lot.name } : null,
      program: { name: wafer.program.name, slug: wafer.program.slug },
      films: groups.map((group) => choiceOf(group.key, group.scans)),
      film: chosen ? await filmOnWafer(em, chosen.key, chosen.scans) : null,
    };
  });
}

/**
 * The scans of a wafer before and after its film, each pair at the positions of the scan before it, as a file that is read back without
 * a change: in the order of their azimuths, before and after in turn.
 * @throws 404 for a wafer that is not there or of another program, or one whose points are not at hand
 */
export async function getWaferProfiles(
  scope: ActorScope,
  id: string | undefined,
  key: string | null,
): Promise<{ name: string; profiles: KeptProfile[] }> {
  return inScope(scope, async (em) => {
    const { wafer, chosen } = await chosenFilm(em, scope, id, key);
    const tools: KnownTools = new Map();
    const profiles = [];
    const scans = (chosen?.scans ?? []).toSorted((a, b) => (a.azimuth ?? -1) - (b.azimuth ?? -1));
    for (const scan of scans) {
      const { points } = await scanOnWafer(em, scan as Scan, tools);
      const found = await points();
      if (!found) continue;
      const { x, before, after } = matchScans(found.pre, found.post);
      for (const z of [before, after]) profiles.push({ along: "position" as const, x: [...x], z: [...z] });
    }
    if (profiles.length === 0) throw notFound("profile of this wafer");
    return { name: wafer.name, profiles };
  });
}

async function chosenFilm(em: EntityManager, scope: ActorScope, id: string | undefined, key: string | null) {
  const wafer = await em.findOne(Wafer, { id: idFrom(id, "wafer") }, { populate: ["program", "lot"] });
  if (!wafer) throw notFound("wafer");
  requireInProgram(scope, "see the work", wafer.program.id, "wafer");
  const groups: { key: string; scans: [LoadedScan, ...LoadedScan[]] }[] = [];
  for (const scan of await scansOf(em, wafer.id)) {
    const group = groups.find((one) => one.key === filmKey(scan));
    if (group) group.scans.push(scan);
    else groups.push({ key: filmKey(scan), scans: [scan] });
  }
  return { wafer, groups, chosen: groups.find((group) => group.key === key) ?? groups[0] ?? null };
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

function choiceOf(key: string, [{ film, parameters }, ...others]: [LoadedScan, ...LoadedScan[]]): FilmChoice {
  return { key, name: film?.name ?? "film not named", thickness: parameters.filmThickness, scans: 1 + others.length };
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

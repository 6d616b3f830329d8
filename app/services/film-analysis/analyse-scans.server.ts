import type { EntityManager } from "@mikro-orm/postgresql";
import type { Scan } from "#app/db/entities/scan.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { analyseFilm } from "#app/lib/film-analysis/analyse.ts";
import type { PlacedPair } from "#app/lib/film-analysis/pair-points.ts";
import type { FilmAnalysis } from "#app/schemas/film-analysis.ts";
import { filmSubject } from "./film-subject.server.ts";
import { keptAnalysis } from "./kept-analyses.server.ts";
import { scanOnWafer, type KnownTools, type ScanOnWafer } from "./scan-on-wafer.server.ts";

/** What the analysis of some scans needs of their entities. */
export const FOR_ANALYSIS = ["film", "instrument", "before", "after", "result"] as const;

export type Analysed = { analysis: FilmAnalysis; fault: null } | { analysis: null; fault: string };

/** What scans of one film on one wafer say together, the newest first, or why they say nothing. */
export async function analyseScans(em: EntityManager, scans: [Scan, ...Scan[]]): Promise<Analysed> {
  const [newest] = scans;
  const tools: KnownTools = new Map();
  const placed: ScanOnWafer[] = [];
  for (const scan of scans) placed.push(await scanOnWafer(em, scan, tools));
  const subject = await filmSubject(em, {
    film: newest.film ?? null,
    program: newest.program.id,
    wafer: newest.wafer?.id ?? null,
    parameters: newest.parameters,
  });
  const now = new Date();
  const today = { year: now.getUTCFullYear(), month: now.getUTCMonth() + 1, day: now.getUTCDate() };
  // Files of a scan never change, so its id stands for its points and for its result.
  const inputs = [placed.map(({ pair: { result: _, ...rest } }) => rest), subject, today];
  return keptAnalysis(inputs, async () => {
    const pairs: PlacedPair[] = [];
    for (const { pair, points } of placed) pairs.push({ ...pair, points: await points() });
    return analysed(pairs, subject, today);
  });
}

function analysed(...[pairs, subject, today]: Parameters<typeof analyseFilm>): Analysed {
  try {
    return { analysis: analyseFilm(pairs, subject, today), fault: null };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return { analysis: null, fault: `The scans give no answer together: ${error.field} ${error.reason}.` };
  }
}

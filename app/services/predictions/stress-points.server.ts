import type { EntityManager } from "@mikro-orm/postgresql";
import { FilmStressInUse } from "#app/db/entities/film-stress-in-use.ts";
import { FilmStressValue } from "#app/db/entities/film-stress-value.ts";
import { Scan } from "#app/db/entities/scan.ts";
import { standardUncertainty, type Measured } from "#app/engine/measured.ts";
import type { PredictionPoint } from "#app/schemas/prediction.ts";

/**
 * Scans of these programs and films beside the stress that each film had in use when its wafer was measured: that of before the
 * scan was accepted. What a film's history has set aside is left out here too, and a wafer that has rolled gives no stress.
 */
export async function stressPoints(
  em: EntityManager,
  programs: readonly string[],
  films: ReadonlySet<string> | null,
): Promise<PredictionPoint[]> {
  const scans = await em.find(
    Scan,
    { program: { $in: [...programs] }, film: films ? { $in: [...films] } : { $ne: null } },
    { populate: ["program", "film", "afterScan"], orderBy: { createdAt: "asc", id: "asc" } },
  );
  const inUse = await stressesInUse(em, [...new Set(scans.flatMap(({ film }) => (film ? [film.id] : [])))]);
  const values = await em.find(FilmStressValue, { scan: { $in: scans.map(({ id }) => id) } });
  const accepted = new Map(values.flatMap((value) => (value.scan ? [[value.scan.id, value] as const] : [])));
  return scans.flatMap((scan): PredictionPoint[] => {
    const value = accepted.get(scan.id);
    const measuredUncertainty = value?.standardUncertainty ?? scan.stressUncertainty;
    if (!scan.film || scan.curled || !(measuredUncertainty > 0) || value?.state === "set aside") return [];
    const at = value?.measuredAt ?? scan.afterScan?.measuredAt ?? scan.createdAt;
    const stress = stressAt(inUse.get(scan.film.id) ?? [], at);
    if (!stress) return [];
    return [
      {
        id: scan.id,
        group: scan.film.name,
        name: scan.label,
        program: scan.program.name,
        predicted: stress.value,
        predictedUncertainty: standardUncertainty(stress),
        // A mean's tolerance is how films differ, each by itself; a stated value is off by the same for all of them.
        ...(stress.meanOf === undefined ? { shared: `${scan.film.id} ${stress.value}` } : {}),
        measured: value?.value ?? scan.stress,
        measuredUncertainty,
        stated: true,
        measuredAt: at.toISOString(),
        instrument: value?.instrument ?? scan.instrumentName,
        path: `/scans/${scan.id}`,
      },
    ];
  });
}

interface Since {
  since: Date;
  stress: Measured;
}

async function stressesInUse(em: EntityManager, films: readonly string[]): Promise<Map<string, Since[]>> {
  const rows = await em.find(FilmStressInUse, { film: { $in: [...films] } }, { orderBy: { since: "asc", id: "asc" } });
  const found = new Map<string, Since[]>();
  for (const { film, since, stress } of rows) found.set(film.id, [...(found.get(film.id) ?? []), { since, stress }]);
  return found;
}

/** The stress in use at a time; of a wafer that was measured before the film's first is on record, that one. */
function stressAt(rows: readonly Since[], at: Date): Measured | undefined {
  return (rows.findLast(({ since }) => since <= at) ?? rows[0])?.stress;
}

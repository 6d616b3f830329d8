import type { EntityManager, Loaded } from "@mikro-orm/postgresql";
import { FilmStressValue } from "#app/db/entities/film-stress-value.ts";
import type { Film } from "#app/db/entities/film.ts";
import { Scan } from "#app/db/entities/scan.ts";
import { stressMean, type MeanReading } from "#app/lib/film-mean.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { Acceptance, AcceptedAs } from "#app/schemas/accept-scan.ts";
import type { AcceptValues } from "#app/schemas/accept-form.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { analyseScans, FOR_ANALYSIS } from "../film-analysis/analyse-scans.server.ts";
import { whereUsed } from "../library/use.server.ts";
import { requireInProgram, requireOnSite } from "../permission.server.ts";
import { conflictOf, saving, touch, type Saved } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";
import { holdFilm, newValue, takeMean, usesMean, valuesOf } from "./film-values.server.ts";
import { scanStress, type ScanStress } from "./scan-stress.ts";

type WholeScan = Loaded<Scan, (typeof FOR_ANALYSIS)[number] | "program" | "createdBy" | "afterScan">;

async function findScan(em: EntityManager, scope: ActorScope, id: string | undefined): Promise<WholeScan> {
  const scan = await em.findOne(
    Scan,
    { id: idFrom(id, "scan") },
    { populate: [...FOR_ANALYSIS, "program", "createdBy", "afterScan"] },
  );
  if (!scan) throw notFound("scan");
  requireInProgram(scope, "see the work", scan.program.id, "scan");
  return scan;
}

/** Where a scan stands in its film's history, for the scan's own page; null for a scan of no film. */
export async function acceptedAs(scope: ActorScope, scanId: string | undefined): Promise<AcceptedAs | null> {
  return inScope(scope, async (em) => {
    const scan = await findScan(em, scope, scanId);
    if (!scan.film) return null;
    const value = await em.findOne(FilmStressValue, { scan }, { populate: ["acceptedBy", "film"] });
    return {
      film: { id: scan.film.id, name: scan.film.name },
      value: value && {
        state: value.state,
        film: { id: value.film.id, name: value.film.name },
        at: value.acceptedAt.toISOString(),
        by: value.acceptedBy.name,
      },
      mayAccept: mayInProgram(scope.actor, "accept stresses", scan.program.id),
    };
  });
}

async function stressOf(em: EntityManager, scan: WholeScan, film: Film): Promise<ScanStress | string> {
  const { analysis } = await analyseScans(em, [scan as Scan]);
  return scanStress(scan, scan.result.get(), film, analysis?.stress ?? null);
}

const NO_FILM = "No film of the library is named for this scan, so there is no history that it could go into.";

const readingOf = (stress: ScanStress, at: Date): MeanReading => ({ ...stress, measuredAt: at, state: "accepted" });

/**
 * What accepting a scan would do: its stress, the film's value in use before and after, and why it cannot be accepted if it cannot.
 * @throws 403 for a role that may not accept in the scan's program, 404 for a scan that is not the person's own
 */
export async function acceptance(scope: ActorScope, scanId: string | undefined): Promise<Acceptance> {
  const found = await inScope(scope, async (em) => {
    const scan = await findScan(em, scope, scanId);
    requireInProgram(scope, "accept stresses", scan.program.id, "scan");
    const head = {
      scan: { id: scan.id, label: scan.label, program: scan.program.name },
      measuredOn: measuredAt(scan).toISOString().slice(0, 10),
      instrument: scan.instrumentName,
    };
    if (!scan.film) return { ...head, offer: null, refused: NO_FILM, film: null };
    const film = scan.film as Film;
    const own = await em.findOne(FilmStressValue, { scan }, { populate: ["acceptedBy"] });
    const refused = own ? alreadyWords(own) : null;
    const stress = await stressOf(em, scan, film);
    const named = {
      id: film.id,
      name: film.name,
      version: film.version,
      stress: film.stress,
      usesMean: usesMean(film),
    };
    if (refused !== null || typeof stress === "string")
      return { ...head, offer: null, refused: refused ?? String(stress), film: named };
    const values = await valuesOf(em, film.id);
    const mean = stressMean([...values, readingOf(stress, measuredAt(scan))]);
    const instruments = [...new Set(values.map(({ instrument }) => instrument).filter(Boolean))];
    return { ...head, offer: mean && { stress, mean, instruments }, refused: null, film: named };
  });
  const uses = found.film ? await whereUsed(scope, "film", found.film.id) : [];
  return { ...found, flows: uses.filter(({ kind }) => kind === "flow").length };
}

/** When the wafer was measured with its film, as the file says; else when the scan came. */
const measuredAt = ({ afterScan, createdAt }: WholeScan): Date => afterScan?.measuredAt ?? createdAt;

function alreadyWords({ acceptedAt, acceptedBy, state }: Loaded<FilmStressValue, "acceptedBy">): string {
  const when = `${acceptedAt.toISOString().slice(0, 16).replace("T", " ")} UTC by ${acceptedBy.name}`;
  return state === "accepted"
    ? `This scan was accepted into the film’s history already, at ${when}.`
    : `This scan was accepted at ${when} and is set aside now. Put it back on the film’s page.`;
}

export type Accepted = Exclude<Saved, { outcome: "name taken" }> | { outcome: "refused"; reason: string };

/**
 * Takes a scan's stress into its film's history. The value in use follows when it is the mean already, or when asked to. Somebody
 * who saved the film since `version` was seen is a conflict, and nothing is written.
 * @throws 403 for a role that may not, 404 for a scan that is not the person's own
 */
export async function acceptScan(
  scope: ActorScope,
  scanId: string | undefined,
  { version, values }: { version: number | null; values: AcceptValues },
): Promise<Accepted> {
  requireOnSite(scope, "edit films");
  const saved = await saving<{ outcome: "refused"; reason: string }>(() =>
    inScope(scope, async (em) => {
      const scan = await findScan(em, scope, scanId);
      requireInProgram(scope, "accept stresses", scan.program.id, "scan");
      if (!scan.film) return { outcome: "refused", reason: NO_FILM };
      const film = await holdFilm(em, scan.film.id);
      const own = await em.findOne(FilmStressValue, { scan }, { populate: ["acceptedBy"] });
      if (own) return { outcome: "refused", reason: alreadyWords(own) };
      const conflict = conflictOf(film, version);
      if (conflict) return { outcome: "conflict", conflict };
      const stress = await stressOf(em, scan, film);
      if (typeof stress === "string") return { outcome: "refused", reason: stress };
      em.create(FilmStressValue, {
        ...newValue(scope, values, stress),
        film,
        scan,
        filmThickness: scan.parameters.filmThickness,
      });
      await em.flush();
      if (values.use || usesMean(film)) takeMean(film, await valuesOf(em, film.id), scope);
      else touch(film, scope);
      await em.flush();
      return { outcome: "saved", id: film.id };
    }),
  );
  return saved.outcome === "name taken" ? { outcome: "refused", reason: AT_ONCE } : saved;
}

const AT_ONCE = "Somebody accepted this scan at the same moment. It is in the film’s history now.";

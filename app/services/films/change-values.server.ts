import type { EntityManager } from "@mikro-orm/postgresql";
import { FilmStressValue } from "#app/db/entities/film-stress-value.ts";
import type { Film } from "#app/db/entities/film.ts";
import type { TypedStress } from "#app/schemas/stress-value-form.ts";
import { COVERAGE } from "#app/lib/scan-answer.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { conflictOf, saving, touch, type Saved } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";
import { holdFilm, newValue, takeMean, usesMean, valuesOf } from "./film-values.server.ts";

/** What became of a change to a film's history. */
export type HistoryChanged = Saved | { outcome: "refused"; reason: string };

interface Asked {
  filmId: string | undefined;
  /** of the film when its page was opened */
  version: number | null;
}

/** Changes the values of a film; a sentence says why it does not. */
type Work = (em: EntityManager, film: Film) => Promise<string | null>;

/** Does `work` on a film that nobody has changed since. The mean follows afterwards where it is in use, or is to be from now on. */
async function changeHistory(
  scope: ActorScope,
  { filmId, version }: Asked,
  work: Work,
  { take = false } = {},
): Promise<HistoryChanged> {
  requireOnSite(scope, "edit films");
  return saving<{ outcome: "refused"; reason: string }>(() =>
    inScope(scope, async (em) => {
      const film = await holdFilm(em, filmId);
      const conflict = conflictOf(film, version);
      if (conflict) return { outcome: "conflict", conflict };
      const refused = await work(em, film);
      if (refused !== null) return { outcome: "refused", reason: refused };
      await em.flush();
      const follows = take || usesMean(film);
      if (!follows) touch(film, scope);
      else if (!takeMean(film, await valuesOf(em, film.id), scope)) return { outcome: "refused", reason: NONE_COUNTS };
      await em.flush();
      return { outcome: "saved", id: film.id };
    }),
  );
}

async function findValue(em: EntityManager, film: Film, id: string | undefined): Promise<FilmStressValue> {
  const value = await em.findOne(
    FilmStressValue,
    { id: idFrom(id, "value"), film },
    { populate: ["setAsideBy", "putBackBy"] },
  );
  if (!value) throw notFound("value");
  return value;
}

const NONE_COUNTS = "No value of this film counts, so there is no mean.";
const LAST =
  "The film uses the mean of its accepted values, and this is the last one that counts. Accept another first, or state a stress with Change.";

/** Sets a value aside: it stays in the history with the reason and takes no part in mean and limits. */
export async function setValueAside(
  scope: ActorScope,
  asked: Asked,
  { id, reason }: { id: string | undefined; reason: string },
): Promise<HistoryChanged> {
  return changeHistory(scope, asked, async (em, film) => {
    const value = await findValue(em, film, id);
    if (value.state === "set aside")
      return `${value.setAsideBy?.name ?? "Somebody"} has set this value aside already: ${value.setAsideReason ?? ""}`;
    const counted = await em.count(FilmStressValue, { film, state: "accepted" });
    if (usesMean(film) && counted === 1) return LAST;
    Object.assign(value, {
      state: "set aside",
      setAsideReason: reason,
      setAsideAt: new Date(),
      setAsideBy: scope.actor.id,
      putBackAt: null,
      putBackBy: null,
    });
    return null;
  });
}

/** Lets a value count again that was set aside; why it was stays with it. */
export async function putValueBack(
  scope: ActorScope,
  asked: Asked,
  { id }: { id: string | undefined },
): Promise<HistoryChanged> {
  return changeHistory(scope, asked, async (em, film) => {
    const value = await findValue(em, film, id);
    if (value.state === "accepted") return "This value counts already: somebody has put it back.";
    Object.assign(value, { state: "accepted", putBackAt: new Date(), putBackBy: scope.actor.id });
    return null;
  });
}

/** Takes a value into the history that was measured elsewhere. */
export async function addTypedValue(scope: ActorScope, asked: Asked, typed: TypedStress): Promise<HistoryChanged> {
  return changeHistory(scope, asked, async (em, film) => {
    const figures = {
      value: typed.value,
      standardUncertainty: typed.uncertainty / COVERAGE,
      // What it shares with other values is not known of it.
      commonUncertainty: 0,
    };
    em.create(FilmStressValue, {
      ...newValue(scope, typed, figures),
      film,
      scan: null,
      source: typed.source,
      filmThickness: typed.filmThickness,
    });
    return null;
  });
}

/** Puts the mean of the accepted values into use; from then on it follows them. */
export async function putMeanIntoUse(scope: ActorScope, asked: Asked): Promise<HistoryChanged> {
  return changeHistory(scope, asked, () => Promise.resolve(null), { take: true });
}

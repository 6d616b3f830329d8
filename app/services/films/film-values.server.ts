import { randomUUID } from "node:crypto";
import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { FilmStressValue } from "#app/db/entities/film-stress-value.ts";
import { Film } from "#app/db/entities/film.ts";
import { stressMean } from "#app/lib/film-mean.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { AcceptValues } from "#app/schemas/accept-form.ts";
import { touch } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";

/**
 * The film that an id names, held until the transaction ends: whoever changes its history waits, so that no mean is made of values
 * that are no longer all there are.
 */
export async function holdFilm(em: EntityManager, id: string | undefined): Promise<Film> {
  const film = await em.findOne(Film, { id: idFrom(id, "film") }, { lockMode: LockMode.PESSIMISTIC_WRITE });
  if (!film) throw notFound("film");
  await em.populate(film, ["updatedBy"]);
  return film;
}

/** All values of a film's history in the order of their measurement. */
export function valuesOf(em: EntityManager, filmId: string): Promise<FilmStressValue[]> {
  return em.find(FilmStressValue, { film: filmId }, { orderBy: { measuredAt: "asc", acceptedAt: "asc", id: "asc" } });
}

/** Columns of a value that is accepted now. */
export function newValue(
  scope: ActorScope,
  { instrument, measuredAt, reason }: Pick<AcceptValues, "instrument" | "measuredAt" | "reason">,
  figures: { value: number; standardUncertainty: number; commonUncertainty: number },
) {
  const { value, standardUncertainty, commonUncertainty } = figures;
  return {
    id: randomUUID(),
    value,
    standardUncertainty,
    commonUncertainty,
    instrument,
    measuredAt,
    reason,
    state: "accepted" as const,
    source: "",
    acceptedAt: new Date(),
    acceptedBy: scope.actor.id,
  };
}

/** Whether a film's stress in use is the mean of its accepted values, which it then follows. */
export const usesMean = ({ stress }: Pick<Film, "stress">): boolean => stress.meanOf !== undefined;

/** Puts the mean of the values that count into the film; false when none does, and nothing is changed. */
export function takeMean(film: Film, values: readonly FilmStressValue[], scope: ActorScope): boolean {
  const mean = stressMean(values);
  if (!mean) return false;
  film.stress = mean.stress;
  touch(film, scope);
  return true;
}

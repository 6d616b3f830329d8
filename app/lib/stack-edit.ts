import type { Side } from "#app/engine/vocabulary.ts";

/*
 * What is done to the films of a stack as a whole. Lists run as the form has them: top to bottom with the device side up, so the films
 * of the device side come first, the one next to the silicon last.
 */

interface OnSide {
  side: Side;
}

export const otherSide = (side: Side): Side => (side === "front" ? "back" : "front");

const count = (films: readonly OnSide[], side: Side) => films.filter((film) => film.side === side).length;

/** How many films of its side lie between a film and the silicon. */
function depth(films: readonly OnSide[], index: number): number {
  const side = films[index]?.side;
  return films.filter((film, at) => film.side === side && (side === "front" ? at > index : at < index)).length;
}

/** Where in the list a film comes to lie that goes on `side` with so many films between it and the silicon, or on top of all. */
function placeAt(films: readonly OnSide[], side: Side, under: number): number {
  const there = count(films, side);
  const front = count(films, "front");
  return side === "front" ? there - Math.min(under, there) : front + Math.min(under, there);
}

/** Where a copy of a film goes: on that film, away from the silicon. */
export function copyPlace(films: readonly OnSide[], index: number): number {
  return films[index]?.side === "back" ? index + 1 : index;
}

/** Where the mirror image of a film goes: on the other side, as many films away from the silicon as there are. */
export function mirrorPlace(films: readonly OnSide[], index: number): number {
  const side = films[index]?.side ?? "front";
  return placeAt(films, otherSide(side), depth(films, index));
}

/** The films with one of them taken to the other side, as far from the silicon as it was, and where it lies then. */
export function crossed<Film extends OnSide>(films: readonly Film[], index: number): { films: Film[]; index: number } {
  const film = films[index];
  if (!film) return { films: [...films], index };
  const side = otherSide(film.side);
  const rest = films.filter((_, at) => at !== index);
  const to = placeAt(rest, side, depth(films, index));
  return { films: rest.toSpliced(to, 0, { ...film, side }), index: to };
}

/** The device side with its mirror image as the whole back side: such a wafer is balanced. */
export function mirroredDeviceSide<Film extends OnSide>(films: readonly Film[]): Film[] {
  const front = films.filter(({ side }) => side === "front");
  return [...front, ...front.toReversed().map((film) => ({ ...film, side: "back" as const }))];
}

/**
 * The films with one of them moved before the film that is `before` in the list, on `side`, and where it lies then.
 * @param before index in the list as it is, the number of films for its end
 */
export function moved<Film extends OnSide>(
  films: readonly Film[],
  from: number,
  { before, side }: { before: number; side: Side },
): { films: Film[]; index: number } {
  const film = films[from];
  if (!film) return { films: [...films], index: from };
  const rest = films.filter((_, at) => at !== from);
  const front = count(rest, "front");
  const wanted = before > from ? before - 1 : before;
  const index = side === "front" ? Math.min(wanted, front) : Math.max(wanted, front);
  return { films: rest.toSpliced(index, 0, { ...film, side }), index };
}

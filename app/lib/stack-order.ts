import type { Side } from "#app/engine/vocabulary.ts";

/**
 * Turns films listed from the silicon outwards into the order in which a cut shows them, top to bottom with the device side up, and
 * back again: the films of the device side are reversed and come first.
 */
export function turnFront<Film extends { side: Side }>(films: readonly Film[]): Film[] {
  const on = (side: Side) => films.filter((film) => film.side === side);
  return [...on("front").toReversed(), ...on("back")];
}

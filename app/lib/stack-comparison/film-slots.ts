import type { Side } from "#app/engine/vocabulary.ts";
import type { ComparedInputs } from "#app/schemas/stack-comparison.ts";
import { turnFront } from "../stack-order.ts";

/** A film that some of the stacks have. */
export interface FilmSlot {
  key: string;
  side: Side;
  name: string;
  /** from 1, among films of the same kind on the same side, from the silicon outwards */
  occurrence: number;
  /** its place among the films of each stack; null where it is not */
  places: (number | null)[];
}

/** The films of several stacks as one list, top to bottom with the device side up: the same film on the same side is one of them. */
export function filmSlots(stacks: readonly Pick<ComparedInputs, "layers">[]): FilmSlot[] {
  const slots: FilmSlot[] = [];
  stacks.forEach(({ layers }, column) => {
    const seen = new Map<string, number>();
    let after = -1;
    layers.forEach(({ side, filmId, filmName }, place) => {
      const film = `${side} ${filmId}`;
      const occurrence = (seen.get(film) ?? 0) + 1;
      seen.set(film, occurrence);
      const key = `${film} ${occurrence}`;
      let at = slots.findIndex((slot) => slot.key === key);
      if (at < 0) {
        at = after + 1;
        slots.splice(at, 0, { key, side, name: filmName, occurrence, places: stacks.map(() => null) });
      }
      const slot = slots[at];
      if (slot) slot.places[column] = place;
      after = Math.max(after, at);
    });
  });
  return turnFront(slots);
}

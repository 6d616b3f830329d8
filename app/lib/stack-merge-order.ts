import type { Side } from "#app/engine/vocabulary.ts";
import { filmName, type Placed } from "./stack-differences.ts";
import { whoseOf, type MergeChoices, type MergeRow } from "./stack-merge-rows.ts";
import type { LayerText } from "./stack-text.ts";

/** A film in somebody's order. */
interface Seat {
  id: string;
  placed: Placed;
}

/** The films of each, top to bottom, by ids that are the same for the same film of the opened stack. */
export interface Lists {
  opened: Seat[];
  mine: Seat[];
  theirs: Seat[];
}

type Layers = ReadonlyMap<string, LayerText | null>;
const SIDES: Record<Side, string> = { front: "device side", back: "back side" };

const ORDER = "order";
const ON_TOP = "on top";

/** The order of two people's films put together: whoever has moved something gives it, and where both have, it is asked. */
export function mergedOrder(lists: Lists) {
  const row = orderRow(lists);
  const seats = (layers: Layers, choices: MergeChoices) => {
    const source = row ? whoseOf(row, choices) : "theirs";
    const mineOnTop = choices[ON_TOP] !== "theirs";
    return seated(lists, source, layers, source === "theirs" ? mineOnTop : !mineOnTop);
  };
  return {
    rows: (layers: Layers): MergeRow[] => {
      const asked = row ? [row] : [];
      return seats(layers, {}).clash ? [...asked, onTopRow(lists)] : asked;
    },
    layers: (layers: Layers, choices: MergeChoices): LayerText[] => {
      const { order } = seats(layers, choices);
      const films = order.flatMap(({ id, placed }) => {
        const layer = layers.get(id);
        return layer ? [{ ...layer, side: placed.layer.side }] : [];
      });
      return (["front", "back"] as const).flatMap((side) => films.filter((film) => film.side === side));
    },
  };
}

/** Whether somebody has moved films that all three have, by the sequence of them and their sides. */
function orderRow({ opened, mine, theirs }: Lists): MergeRow | null {
  const common = (list: Seat[]) =>
    list.filter(({ id }) => [opened, mine, theirs].every((other) => other.some((seat) => seat.id === id)));
  const says = (list: Seat[]) =>
    common(list)
      .map(({ id, placed }) => `${placed.layer.side} ${id}`)
      .join();
  const [was, own, other] = [says(opened), says(mine), says(theirs)];
  if (own === other || (own === was && other === was)) return null;
  const by = own === was ? "them" : other === was ? "you" : "both";
  const words = (list: Seat[]) => orderWords(common(list));
  const label = "Order of the films, from the top";
  return { key: ORDER, label, opened: words(opened), mine: words(mine), theirs: words(theirs), by };
}

/** 'Polymer dielectric A, Plated copper A; back side: Polymer dielectric A'. */
function orderWords(list: readonly Seat[]): string {
  const on = (side: Side) =>
    list.filter(({ placed }) => placed.layer.side === side).map(({ placed }) => filmName(placed));
  const [front, back] = [on("front"), on("back")];
  if (back.length === 0) return front.join(", ");
  return [...(front.length > 0 ? [front.join(", ")] : []), `${SIDES.back}: ${back.join(", ")}`].join("; ");
}

/** Both have added a film at the very same place: which one lies above is nobody's to guess. */
function onTopRow({ mine, theirs }: Lists): MergeRow {
  const added = (list: Seat[]) =>
    list.flatMap(({ id, placed }) => (id.startsWith("b") ? [] : [filmName(placed)])).join(", ");
  return {
    key: ON_TOP,
    label: "Which of the added films lies above the other",
    opened: "not there",
    mine: added(mine),
    theirs: added(theirs),
    by: "both",
  };
}

const isNew = ({ id }: Seat) => !id.startsWith("b");

/** One list with the films of the other put to the neighbour above that both have. @param above whether what is put in lies above what was added there */
function seated(lists: Lists, source: "mine" | "theirs", layers: Layers, above: boolean) {
  const stays = ({ id }: Seat) => (layers.get(id) ?? null) !== null;
  const order = lists[source].filter(stays);
  const guests = lists[source === "mine" ? "theirs" : "mine"];
  let clash = false;
  for (const [place, guest] of guests.entries()) {
    if (!stays(guest) || order.some(({ id }) => id === guest.id)) continue;
    const { side } = guest.placed.layer;
    const host = guests
      .slice(0, place)
      .toReversed()
      .find(({ id }) => order.some((seat) => seat.id === id && seat.placed.layer.side === side));
    const first = order.findIndex((seat) => seat.placed.layer.side === side);
    let at = host ? order.findIndex(({ id }) => id === host.id) + 1 : first === -1 ? order.length : first;
    const meets = (seat: Seat | undefined) =>
      seat !== undefined && isNew(seat) && isNew(guest) && seat.placed.layer.side === side && !guests.includes(seat);
    if (meets(order[at])) {
      clash = true;
      while (!above && meets(order[at])) at += 1;
    }
    order.splice(at, 0, guest);
  }
  return { order, clash };
}

import { differing, FILM_UNITS, HEAD_UNITS, wordsOf, type Unit } from "./stack-merge-units.ts";
import { whoseOf, type MergeChoices, type MergeRow } from "./stack-merge-rows.ts";
import { mergedOrder, type Lists } from "./stack-merge-order.ts";
import { filmName, pairFilms, placed, type Placed, type StackNames } from "./stack-differences.ts";
import type { LayerText, StackText } from "./stack-text.ts";

export interface StackMerge {
  rows: MergeRow[];
  /** The stack by these choices: what only one has changed is theirs who changed it, unless it is chosen otherwise. */
  merge: (choices: MergeChoices) => StackText;
}

interface Three<Of> {
  opened: Of;
  mine: Of;
  theirs: Of;
}

/** What is still to be decided. */
export const undecided = ({ rows }: StackMerge, choices: MergeChoices): MergeRow[] =>
  rows.filter(({ key, by }) => by === "both" && choices[key] === undefined);

/**
 * Two people's changes of one stack put together. A value goes with its tolerance and its source, and the cut of a film with its
 * coverage: half of one and half of the other would be what nobody has said. A film that one has changed and the other has replaced or
 * taken out is decided as a whole.
 */
export function mergeOf(stacks: Three<StackText>, names: StackNames): StackMerge {
  const head = HEAD_UNITS.map((unit) => ({ unit, row: unitRow(unit, stacks, names, { key: "", of: "" }) }));
  const films = filmsOf(stacks, names).map((film) => filmMerge(film, names));
  const lists = listsOf(stacks, names);
  const layersBy = (choices: MergeChoices) => new Map(films.map(({ id, decide }) => [id, decide(choices)]));
  const order = mergedOrder(lists);
  const rows = [...head.map(({ row }) => row), ...films.flatMap((film) => film.rows), ...order.rows(layersBy({}))];
  return {
    rows: rows.filter((row) => row !== null).toSorted((one, next) => ORDER.indexOf(one.by) - ORDER.indexOf(next.by)),
    merge: (choices) => {
      const whole = head.reduce((text, { unit, row }) => taken(unit, text, stacks, row, choices), stacks.theirs);
      return { ...whole, layers: order.layers(layersBy(choices), choices) };
    },
  };
}

/** What needs a decision comes first. */
const ORDER = ["both", "them", "you"];

function rowBy(changed: { mine: boolean; theirs: boolean; alike: boolean }): MergeRow["by"] | null {
  const { mine, theirs, alike } = changed;
  if (mine && theirs) return alike ? null : "both";
  return mine ? "you" : theirs ? "them" : null;
}

function unitRow<Of>(
  unit: Unit<Of>,
  { opened, mine, theirs }: Three<Of>,
  names: StackNames,
  place: { key: string; of: string },
): MergeRow | null {
  const by = rowBy({
    mine: differing(unit, opened, mine).length > 0,
    theirs: differing(unit, opened, theirs).length > 0,
    alike: differing(unit, mine, theirs).length === 0,
  });
  if (by === null) return null;
  const say = wordsOf(unit, [opened, mine, theirs], names);
  const words = { opened: say(opened), mine: say(mine), theirs: say(theirs) };
  return { key: `${place.key}${unit.field}`, label: `${unit.label}${place.of}`, ...words, by };
}

/** A state with one unit taken from whose it is to be. */
function taken<Of>(unit: Unit<Of>, into: Of, from: Three<Of>, row: MergeRow | null, choices: MergeChoices): Of {
  return { ...into, ...unit.take(row ? from[whoseOf(row, choices)] : from.theirs) };
}

/** A film of the opened stack or a new one, with what each has made of it; null where it is not there. */
interface Film extends Three<Placed | null> {
  id: string;
}

function filmsOf(stacks: Three<StackText>, names: StackNames): Film[] {
  const opened = placed(stacks.opened.layers, names);
  const own = pairFilms(opened, placed(stacks.mine.layers, names));
  const other = pairFilms(opened, placed(stacks.theirs.layers, names));
  const after = (pairs: typeof own, index: number) =>
    pairs.find(({ before }) => before?.index === index)?.after ?? null;
  const added = (pairs: typeof own) => pairs.flatMap(({ before, after: film }) => (!before && film ? [film] : []));
  return [
    ...opened.map((film) => ({
      id: `b${film.index}`,
      opened: film,
      mine: after(own, film.index),
      theirs: after(other, film.index),
    })),
    ...added(own).map((film) => ({ id: `m${film.index}`, opened: null, mine: film, theirs: null })),
    ...added(other).map((film) => ({ id: `t${film.index}`, opened: null, mine: null, theirs: film })),
  ];
}

/** The films of each in their order, by the ids of `filmsOf`. */
function listsOf(stacks: Three<StackText>, names: StackNames): Lists {
  const films = filmsOf(stacks, names);
  const list = (whose: keyof Three<unknown>) =>
    films
      .flatMap((film) => (film[whose] ? [{ id: film.id, placed: film[whose] }] : []))
      .toSorted((one, next) => one.placed.index - next.placed.index);
  return { opened: list("opened"), mine: list("mine"), theirs: list("theirs") };
}

interface FilmMerge {
  id: string;
  rows: MergeRow[];
  /** the film by these choices; null where it is not in the stack then */
  decide: (choices: MergeChoices) => LayerText | null;
}

function filmMerge({ id, opened, mine, theirs }: Film, names: StackNames): FilmMerge {
  if (opened && mine && theirs) {
    const three = { opened: opened.layer, mine: mine.layer, theirs: theirs.layer };
    return isReplaced(three)
      ? wholeFilm({ id, opened, mine, theirs }, "both", names)
      : { id, ...filmByUnits(id, three, filmName(opened), names) };
  }
  const [left, who] = mine ? [mine, "mine" as const] : [theirs, "theirs" as const];
  if (!left) return { id, rows: [], decide: () => null };
  if (!opened) return wholeFilm({ id, opened, mine, theirs }, who === "mine" ? "you" : "them", names);
  const kept = left.layer.side === opened.layer.side && changedUnits(opened.layer, left.layer).length === 0;
  return wholeFilm({ id, opened, mine, theirs }, kept ? (who === "mine" ? "them" : "you") : "both", names);
}

const changedUnits = (one: LayerText, other: LayerText) =>
  FILM_UNITS.filter((unit) => differing(unit, one, other).length > 0);

/** Whether one has chosen another film where the other has changed the film that was there. */
function isReplaced({ opened, mine, theirs }: Three<LayerText>): boolean {
  const chosen = mine.film !== opened.film || theirs.film !== opened.film;
  const both = changedUnits(opened, mine).length > 0 && changedUnits(opened, theirs).length > 0;
  return chosen && both && changedUnits(mine, theirs).length > 0;
}

function filmByUnits(id: string, three: Three<LayerText>, name: string, names: StackNames): Omit<FilmMerge, "id"> {
  const units = FILM_UNITS.map((unit) => ({
    unit,
    row: unitRow(unit, three, names, { key: `${id}.`, of: ` of ${name}` }),
  }));
  return {
    rows: units.flatMap(({ row }) => row ?? []),
    decide: (choices) => units.reduce((film, { unit, row }) => taken(unit, film, three, row, choices), three.theirs),
  };
}

function wholeFilm({ id, opened, mine, theirs }: Film, by: MergeRow["by"], names: StackNames): FilmMerge {
  const shown = [opened, mine, theirs].flatMap((film) => film?.layer ?? []);
  const say = (film: Placed | null, gone: string) => (film ? filmWords(film, shown, names) : gone);
  const row: MergeRow = {
    key: id,
    label: `Film ${filmName(opened ?? mine ?? (theirs as Placed))}`,
    opened: say(opened, "not there"),
    mine: say(mine, opened ? "taken out" : "not there"),
    theirs: say(theirs, opened ? "taken out" : "not there"),
    by,
  };
  return { id, rows: [row], decide: (choices) => ({ mine, theirs })[whoseOf(row, choices)]?.layer ?? null };
}

/** '5 µm, device side, 2 of 3 from the top', with its name and whatever else differs among the films beside it. */
function filmWords(film: Placed, among: readonly LayerText[], names: StackNames): string {
  const others = FILM_UNITS.filter(({ field }) => field !== "film" && field !== "thickness").flatMap((unit) => {
    const differs = among.some((other) => differing(unit, film.layer, other).length > 0);
    return differs ? [`${unit.label.toLowerCase()}: ${wordsOf(unit, among, names)(film.layer)}`] : [];
  });
  const thickness = film.layer.thickness.value || "without a thickness";
  const name = among.some(({ film: id }) => id !== film.layer.film) ? [filmName(film)] : [];
  return [...name, thickness, film.words, ...others].join(", ");
}

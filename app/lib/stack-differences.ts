import { align, type Pair } from "./align.ts";
import { FILM_CUT_NAMES, type FilmCut } from "./film-cut.ts";
import { readQuantity, type QuantityRule } from "./read-quantity.ts";
import { RULES } from "#app/schemas/ranges.ts";
import type { LayerText, StackText } from "./stack-text.ts";

/** One field in which two states of a stack differ, or a film that only one of them has. */
export interface StackDifference {
  /** the same for the same field of two later states of one earlier state */
  key: string;
  /** 'Thickness of Plated copper A' */
  label: string;
  before: string;
  after: string;
  /** the field's name in the form of the later state; null for a film that is gone */
  field: string | null;
}

/** Names for the ids in a form's text. */
export interface StackNames {
  films: readonly { id: string; name: string }[];
  silicon: readonly { id: string; name: string }[];
}

const BLANK = "blank";
const NOT_CHOSEN = "not chosen";
const nameIn = (list: readonly { id: string; name: string }[], id: string) =>
  id === "" ? NOT_CHOSEN : (list.find((each) => each.id === id)?.name ?? "no longer in the library");

/** A field of a stack or of a film: how it is called, what it says, and the rule that its quantity is read by. */
export interface Part<Of> {
  field: string;
  label: string;
  of: (text: Of) => string;
  rule?: QuantityRule;
  words?: (text: string, names: StackNames) => string;
}

type Measured = LayerText["thickness"];

function measuredParts<Of>(field: string, what: string, of: (text: Of) => Measured, rule: QuantityRule): Part<Of>[] {
  const lower = what.charAt(0).toLowerCase() + what.slice(1);
  const part = (key: keyof Measured, label: string, own?: QuantityRule) => ({
    field: `${field}.${key}`,
    label,
    of: (text: Of) => of(text)[key] ?? "",
    ...(own && { rule: own }),
  });
  return [
    part("value", what, rule),
    part("tolerance", `Tolerance of the ${lower}`, rule),
    part("source", `Source of the ${lower}`),
    part("note", `Remark on the ${lower}`),
    part("on", `Day of the ${lower}`),
  ];
}

export const STACK_PARTS: Part<StackText>[] = [
  { field: "name", label: "Name", of: ({ name }) => name },
  { field: "note", label: "Note", of: ({ note }) => note },
  {
    field: "silicon",
    label: "Silicon",
    of: ({ silicon }) => silicon,
    words: (id, { silicon }) => nameIn(silicon, id),
  },
  ...measuredParts<StackText>(
    "siliconThickness",
    "Remaining silicon",
    ({ siliconThickness }) => siliconThickness,
    RULES.siliconThickness,
  ),
];

export const FILM_PARTS: Part<LayerText>[] = [
  { field: "film", label: "Choice", of: ({ film }) => film, words: (id, { films }) => nameIn(films, id) },
  ...measuredParts<LayerText>("thickness", "Thickness", ({ thickness }) => thickness, RULES.filmThickness),
  ...measuredParts<LayerText>("stress", "Stress for this stack", ({ stress }) => stress, RULES.stress),
  {
    field: "cut",
    label: "Cut",
    of: ({ cut }) => cut,
    words: (cut) => FILM_CUT_NAMES[cut as FilmCut] ?? BLANK,
  },
  { field: "coverage", label: "Area coverage", of: ({ coverage }) => coverage, rule: RULES.coverage },
  { field: "lineWidth", label: "Width of the lines", of: ({ lineWidth }) => lineWidth, rule: RULES.lineWidth },
  {
    field: "lineDirection",
    label: "Direction of the lines",
    of: ({ lineDirection }) => lineDirection,
    rule: RULES.lineDirection,
  },
];

/** Whether two texts say the same: '5um' is '5 µm'. */
export function same(one: string, other: string, rule: QuantityRule | undefined): boolean {
  if (one === other) return true;
  if (!rule) return false;
  const [a, b] = [readQuantity(one, rule), readQuantity(other, rule)];
  return a.ok && b.ok && Math.abs(a.value - b.value) <= 1e-9 * Math.max(Math.abs(a.value), Math.abs(b.value));
}

function partDifferences<Of>(
  parts: readonly Part<Of>[],
  [before, after]: [Of, Of],
  names: StackNames,
  place: { key: string; at: string; of: string },
): StackDifference[] {
  return parts.flatMap(({ field, label, of, rule, words }) => {
    const [one, other] = [of(before), of(after)];
    if (same(one, other, rule)) return [];
    const say = (text: string) => (words ? words(text, names) : text || BLANK);
    return [
      {
        key: `${place.key}${field}`,
        label: `${label}${place.of}`,
        before: say(one),
        after: say(other),
        field: `${place.at}${field}`,
      },
    ];
  });
}

export interface Placed {
  layer: LayerText;
  index: number;
  /** of the film; with its place where the stack holds the same film several times */
  name: string;
  words: string;
}

/** The films with their places. */
export function placed(layers: readonly LayerText[], names: StackNames): Placed[] {
  return layers.map((layer, index) => {
    const side = layer.side === "front" ? "device side" : "back side";
    const place = `${index + 1} of ${layers.length}`;
    const alone = layers.filter(({ film }) => film === layer.film).length === 1;
    const film = nameIn(names.films, layer.film);
    const name = layer.film === "" ? `film ${place}` : alone ? film : `${film}, ${place}`;
    return { layer, index, name, words: `${side}, ${place} from the top` };
  });
}

const says = ({ layer }: Placed) => JSON.stringify(layer);
const sidewise = ({ layer }: Placed) => `${layer.side} ${layer.film}`;

/** The fields in which two states of a stack differ, in the order of the form; empty where both say the same. */
export function stackDifferences(before: StackText, after: StackText, names: StackNames): StackDifference[] {
  const films = pairFilms(placed(before.layers, names), placed(after.layers, names));
  return [
    ...partDifferences(STACK_PARTS, [before, after], names, { key: "", at: "", of: "" }),
    ...films.flatMap((pair) => filmDifferences(pair, names)),
  ];
}

/** The films of two states that are the same film, and those that only one of them has. */
export const pairFilms = (before: readonly Placed[], after: readonly Placed[]): Meeting[] =>
  withMoves(align(before, after, [says, sidewise, ({ layer }) => layer.side]));

/** A film as lists name it; with its place where a stack holds the same film several times. */
export const filmName = ({ name }: Placed): string => name;

type Meeting = Pair<Placed> & { moved?: boolean };

/** A film that is gone in one place and new in another with all that it says has moved. */
function withMoves(pairs: readonly Pair<Placed>[]): Meeting[] {
  const gone = pairs.flatMap(({ before, after }) => (before && !after ? [before] : []));
  const met = new Set<Placed>();
  const joined = pairs.map((pair): Meeting => {
    if (pair.before || !pair.after) return pair;
    const own = sideless(pair.after);
    const from = gone.find((film) => !met.has(film) && sideless(film) === own);
    if (!from) return pair;
    met.add(from);
    return { before: from, after: pair.after, moved: true };
  });
  return joined.filter(({ before, after }) => after !== null || before === null || !met.has(before));
}

const sideless = ({ layer }: Placed) => JSON.stringify({ ...layer, side: null });

function filmDifferences({ before, after, moved }: Meeting, names: StackNames): StackDifference[] {
  const name = ({ layer }: Placed) => nameIn(names.films, layer.film);
  const thickness = ({ layer }: Placed) => layer.thickness.value || "without a thickness";
  if (!after)
    return before
      ? [
          {
            key: `layers[${before.index}]`,
            label: `Film ${name(before)}`,
            before: `${thickness(before)}, ${before.words}`,
            after: "taken out",
            field: null,
          },
        ]
      : [];
  const at = `layers[${after.index}].`;
  if (!before)
    return [
      {
        key: `new ${after.words} ${name(after)}`,
        label: `Film ${name(after)}`,
        before: "not there",
        after: `${thickness(after)}, ${after.words}`,
        field: `${at}film`,
      },
    ];
  const key = `layers[${before.index}].`;
  if (moved)
    return [{ key, label: `Place of ${name(after)}`, before: before.words, after: after.words, field: `${at}film` }];
  return partDifferences(FILM_PARTS, [before.layer, after.layer], names, {
    key,
    at,
    of: ` of ${before.layer.film === "" ? after.name : before.name}`,
  });
}

/** What lies between two states, in a few words: 'Thickness of Plated copper A: 7 µm, was 5 µm, and 2 more'. */
export function changeWords(differences: readonly StackDifference[]): string {
  const [first, ...more] = differences;
  if (!first) return "Wording";
  const words = `${first.label}: ${first.after}, was ${first.before}`;
  return more.length === 0 ? words : `${words}, and ${more.length} more`;
}

/** One place of two aligned lists; what has no partner in the other list stands alone. */
export type Pair<T> = { before: T; after: T } | { before: T; after: null } | { before: null; after: T };

/**
 * Pairs the items of two lists by the longest run of keys that both have in the same order. What lies between two such pairs is
 * aligned by the next key, so that a renamed step still meets itself. Whatever is left stands alone: first what is gone, then what
 * is new.
 * @param keys strictest first
 */
export function align<T>(before: readonly T[], after: readonly T[], keys: readonly ((item: T) => string)[]): Pair<T>[] {
  const [key, ...looser] = keys;
  if (!key) return [...before.map((item) => gone(item)), ...after.map((item) => isNew(item))];
  const pairs: Pair<T>[] = [];
  let [fromBefore, fromAfter] = [0, 0];
  const upTo = (toBefore: number, toAfter: number) =>
    pairs.push(...align(before.slice(fromBefore, toBefore), after.slice(fromAfter, toAfter), looser));
  for (const [i, j] of commonPlaces(before.map(key), after.map(key))) {
    upTo(i, j);
    pairs.push({ before: before[i] as T, after: after[j] as T });
    [fromBefore, fromAfter] = [i + 1, j + 1];
  }
  upTo(before.length, after.length);
  return pairs;
}

const gone = <T>(before: T): Pair<T> => ({ before, after: null });
const isNew = <T>(after: T): Pair<T> => ({ before: null, after });

/** Places of the longest common subsequence of two lists, ascending in both. */
function commonPlaces(before: readonly string[], after: readonly string[]): [number, number][] {
  const width = after.length + 1;
  // longest[i * width + j]: length of the longest common subsequence of before from i on and after from j on.
  const longest = new Uint16Array((before.length + 1) * width);
  const at = (i: number, j: number) => longest[i * width + j] ?? 0;
  for (let i = before.length - 1; i >= 0; i -= 1)
    for (let j = after.length - 1; j >= 0; j -= 1)
      longest[i * width + j] = before[i] === after[j] ? at(i + 1, j + 1) + 1 : Math.max(at(i + 1, j), at(i, j + 1));
  const places: [number, number][] = [];
  let [i, j] = [0, 0];
  while (i < before.length && j < after.length) {
    if (before[i] === after[j]) places.push([i++, j++]);
    else if (at(i + 1, j) >= at(i, j + 1)) i += 1;
    else j += 1;
  }
  return places;
}

/** Pairs the steps of two flows: by kind and title, and between those by kind alone. */
export function alignSteps<Step extends { kind: string; title: string }>(
  before: readonly Step[],
  after: readonly Step[],
): Pair<Step>[] {
  return align(before, after, [({ kind, title }) => `${kind}\n${title}`, ({ kind }) => kind]);
}

/** JSON with the keys of every object in order, so that equal values are equal texts whatever order a database hands them back in. */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_, each: unknown) =>
    typeof each === "object" && each !== null && !Array.isArray(each)
      ? Object.fromEntries(Object.entries(each).toSorted(([a], [b]) => (a < b ? -1 : 1)))
      : each,
  );
}

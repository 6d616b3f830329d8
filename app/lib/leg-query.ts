/** What an address needs to stay with a leg, after the mark that is handed in; nothing where there are no legs. */
export function legQuery(mark: "?" | "&" | "", leg: number | string | null | undefined): string {
  return leg === null || leg === undefined || leg === "" ? "" : `${mark}leg=${leg}`;
}

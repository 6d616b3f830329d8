/** Kinds of record whose pages are remembered and can be marked, with the path above them. */
export const KEPT_PATHS = {
  stack: "stacks",
  flow: "flows",
  assessment: "assessments",
  film: "films",
  scan: "scans",
  wafer: "wafers",
  lot: "lots",
} as const;

export type KeptKind = keyof typeof KEPT_PATHS;

export const KEPT_KINDS = Object.keys(KEPT_PATHS) as [KeptKind, ...KeptKind[]];

const PAGE = /^\/([a-z]+)\/([0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12})$/i;

/** The record whose page an address is, or null for every other page. */
export function keptRecordAt(pathname: string): { kind: KeptKind; id: string } | null {
  const [, place, id] = PAGE.exec(pathname) ?? [];
  const kind = KEPT_KINDS.find((known) => KEPT_PATHS[known] === place);
  return kind && id ? { kind, id: id.toLowerCase() } : null;
}

/** How a marked record stands among what a person has marked. */
export const favouriteKey = (kind: KeptKind, id: string): string => `${kind} ${id}`;

/** The kinds of record in the place Carriers & bonds, by their name in the address. */
export const KINDS = {
  carriers: { title: "Carriers", one: "carrier", many: "carriers" },
  "bonding-materials": { title: "Bonding materials", one: "bonding material", many: "bonding materials" },
  tapes: { title: "Tapes", one: "tape", many: "tapes" },
  silicon: { title: "Silicon", one: "silicon wafer", many: "silicon wafers" },
  tools: { title: "Tools", one: "tool", many: "tools" },
} as const;

export type KindSlug = keyof typeof KINDS;

/** The kinds as the library's services know them. */
export const KIND_KEYS = {
  carriers: "carrier",
  "bonding-materials": "bondingMaterial",
  tapes: "tape",
  silicon: "silicon",
  tools: "equipment",
} as const satisfies Record<KindSlug, string>;

/** The kind that an address names, or null. */
export function kindOf(text: string | undefined): KindSlug | null {
  return text !== undefined && Object.hasOwn(KINDS, text) ? (text as KindSlug) : null;
}

export const kindPath = (slug: KindSlug) => `/carriers/${slug}`;

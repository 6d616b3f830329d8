/** A part of the method page and what it is about. */
export interface MethodPart {
  anchor: string;
  title: string;
}

const part = (anchor: string, title: string): MethodPart => ({ anchor, title });

const RULES = part("rules", "handling rules");
const SCANS = part("equations-metrology", "scans and uncertainty");
const STACKS = part("equations-laminate", "stack of layers");
const WORDS = part("glossary", "glossary");

/** Which part tells how the figures of a page come about; the first beginning of an address that fits. */
const PARTS: readonly (readonly [string, MethodPart | null])[] = [
  ["/method", null],
  ["/preferences", part("keys", "keys")],
  ["/search", null],
  ["/demo", null],
  ["/favourites", null],
  ["/films", part("equations-thin-film", "thin film on a thick wafer")],
  ["/stacks", STACKS],
  ["/carriers/silicon", part("equations-silicon", "silicon")],
  ["/carriers/carriers", STACKS],
  ["/carriers/bonding-materials", STACKS],
  ["/carriers", RULES],
  ["/flows", RULES],
  ["/assessments", RULES],
  ["/sheets", RULES],
  ["/scans", SCANS],
  ["/wafers", SCANS],
  ["/lots", SCANS],
  ["/instruments", SCANS],
  ["/import-profiles", SCANS],
  ["/predictions", part("conventions", "signs and words")],
  ["/incidents", RULES],
  ["/jobs", SCANS],
];

/** The part of the method page that belongs to an address; null where there is none to tell. */
export function methodPart(pathname: string): MethodPart | null {
  const found = PARTS.find(([beginning]) => pathname === beginning || pathname.startsWith(`${beginning}/`));
  return found ? found[1] : WORDS;
}

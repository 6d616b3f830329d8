/** What a scan is of, as text of its fields. */
export interface ScanOf {
  wafer: string;
  lot: string;
  slot: string;
  /** degrees from the notch */
  azimuth: string;
  side: "before" | "after" | "";
}

const NAMED = {
  azimuth: /(?:^|[ ])(?:az(?:imuth)? ?(\d{1,3})|(\d{1,3}) ?(?:deg|°))(?= |$)/i,
  slot: /(?:^|[ ])(?:slot ?|s)(\d{1,2})(?= |$)/i,
  lot: /(?:^|[ ])(?:lot ?([a-z0-9-]+)|(l\d[a-z0-9-]*))(?= |$)/i,
  side: /(?:^|[ ])(?:(before|pre|bef)|(after|post|aft))(?= |$)/i,
};
/** A name as wafers have it: letters, then figures. */
const WAFER = /(?:^|[ ])([a-z]{1,4}-?\d{2,}[a-z0-9-]*)(?= |$)/i;
/** Words that say nothing of the wafer. */
const SAYING_NOTHING =
  /(?:^|[ ])(?:film|scan|profile|wafer|copy|az|the|lot|map|summary|figures|thickness|stress|table)(?= |$)/gi;

/**
 * What the name of a file says its scan is of: a proposal for a person to look at, never more.
 * 'M-0388_lot-L12_s07_az045_post.csv' is wafer M-0388 of lot L12, slot 7, 45°, after the film.
 */
export function guessFromName(fileName: string): ScanOf {
  let rest = fileName
    .replace(/\.[a-z0-9]{1,5}$/i, "")
    .replace(/[_()[\],;+.\s]+/g, " ")
    // A dash parts words, but not the letters of a name from its figures.
    .replace(/-(?=\D)|(?<=[a-z]{3})-(?=\d)|(?<=\d)-/gi, " ")
    .trim();
  const taken = (pattern: RegExp): RegExpExecArray | null => {
    const found = pattern.exec(rest);
    if (found) rest = `${rest.slice(0, found.index)} ${rest.slice(found.index + found[0].length)}`.trim();
    return found;
  };
  const side = taken(NAMED.side);
  const azimuth = taken(NAMED.azimuth);
  const slot = taken(NAMED.slot);
  const lot = taken(NAMED.lot);
  const wafer = WAFER.exec(rest)?.[1] ?? rest.replace(SAYING_NOTHING, " ").replace(/\s+/g, " ").trim();
  const turned = Number(azimuth?.[1] ?? azimuth?.[2] ?? NaN);
  return {
    wafer: wafer.slice(0, 60),
    lot: lot?.[1] ?? lot?.[2] ?? "",
    slot: slot?.[1] === undefined ? "" : String(Number(slot[1])),
    azimuth: turned <= 360 ? String(turned) : "",
    side: side === null ? "" : side[1] === undefined ? "after" : "before",
  };
}

/** An angle in the head of a column, 'z 45° (µm)' or 'Height az 90', in degrees; nothing when it names none. */
export function azimuthOfHead(head: string): string {
  const found = /\baz(?:imuth)?[ _=:]*(\d{1,3})\b|(\d{1,3}) ?(?:deg\b|°)/i.exec(head);
  const degrees = Number(found?.[1] ?? found?.[2] ?? NaN);
  return degrees <= 360 ? String(degrees) : "";
}

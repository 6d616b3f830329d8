/** What a wafer is called while only its place in the cassette is known. */
export const slotName = (slot: number): string => `slot ${slot}`;

export interface LabelledWafer {
  name: string;
  slot: number | null;
  lot: string | null;
}

/** A wafer in words: 'M-0388, lot L12, slot 7'. */
export function waferLabel({ name, slot, lot }: LabelledWafer): string {
  const bySlot = slot !== null && name === slotName(slot);
  return [
    ...(bySlot ? [] : [name]),
    ...(lot === null ? [] : [`lot ${lot}`]),
    ...(slot === null ? [] : [`slot ${slot}`]),
  ].join(", ");
}

/** An azimuth in degrees, '22.5°'. */
export const azimuthText = (azimuth: number): string => `${Number(((azimuth * 180) / Math.PI).toFixed(2))}°`;

/** A line of a wafer: 'M-0388, 45°'. */
export const lineLabel = (wafer: LabelledWafer, azimuth: number): string =>
  `${waferLabel(wafer)}, ${azimuthText(azimuth)}`;

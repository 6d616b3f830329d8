/** What of a step is entered on its screen, beside what hands do. */
export const FLOOR_DEEDS = ["measure", "observe", "incident", "stop", "hold"] as const;
export type FloorDeed = (typeof FLOOR_DEEDS)[number];

/** The address of a lot on the floor, or of one of its steps, in one part of its flow; `deed` opens a form of the step. */
export function floorPath(lot: string, step: number | null, leg: number, deed: FloorDeed | null = null): string {
  const query = new URLSearchParams();
  if (leg !== 0) query.set("part", String(leg));
  if (deed !== null) query.set("do", deed);
  const asked = query.size === 0 ? "" : `?${query.toString()}`;
  return `/floor/lots/${lot}${step === null ? "" : `/steps/${step}`}${asked}`;
}

import type { CautionSignName } from "#app/lib/sheet/caution-signs.ts";

/** Strokes on a field of 32 × 32, and what is filled. Drawn for this program; each stands beside its sentence. */
const DRAWINGS: Record<CautionSignName, { lines: string; filled?: string }> = {
  // A drawing sheet with a bent wafer over its datum, and a pencil.
  estimate: {
    lines: "M24 12V4H4v24h14M8 13Q14 20 20 13M7 13h2M19 13h2M29 14l-9 9-1 4 4-1 9-9zM8 24h7",
  },
  // A round wafer broken across, two splinters beside it.
  shards: {
    lines: "M19 5A11 11 0 1 0 11 27l1-5 4-2-3-5 5-2-2-4zM23 8l6-3-2 9zM21 18l8 2-6 3zM16 25l7 1-4 4z",
  },
  // A toothed blade over the line of a wafer.
  blade: {
    lines:
      "M16 3l3 2 3-1 1 3 3 1v4l2 2-2 3v3l-3 1-1 3-3 0-3 2-3-2h-3l-1-3-3-1v-3l-2-3 2-2V8l3-1 1-3 3 1zM3 29h10M19 29h10",
    filled: "M16 11.5a2.5 2.5 0 1 0 .01 0z",
  },
  // A plate with heat rising from it.
  heat: {
    lines:
      "M4 24h24v4H4zM9 19c-3-3 3-5 0-8 -2-3 2-4 0-7M16 19c-3-3 3-5 0-8 -2-3 2-4 0-7M23 19c-3-3 3-5 0-8 -2-3 2-4 0-7",
  },
  // A drop of liquid, and a flame kept apart from it by a wall.
  solvent: {
    lines:
      "M8 8c3 5 5 7 5 11a5 5 0 0 1-10 0c0-4 2-6 5-11zM17 3v26M25 28c-4 0-6-3-5-7 1-3 4-4 3-9 4 2 4 5 4 7l2-2c2 6 0 11-4 11z",
  },
  // A beam on a wafer inside a closed box with its latch.
  laser: {
    lines: "M3 5h26v22H3zM16 9l-6 12M16 9v12M16 9l6 12M7 22h18M29 13h3v6h-3",
    filled: "M14 7h4v3h-4z",
  },
  // A wafer that has come off its chuck.
  vacuum: {
    lines: "M4 25h24v4H4zM10 25v-3M16 25v-3M22 25v-3M4 12l24-6M9 18v-3M16 17v-4M23 16v-5",
  },
  // A card with steps ticked off.
  "run card": {
    lines: "M7 5h18v24H7zM12 5V3h8v2M11 11h3v3h-3zM17 12.5h5M11 17h3v3h-3zM17 18.5h5M11 23h3v3h-3zM17 24.5h5",
    filled: "M11.5 11.5h2v2h-2z",
  },
};

/** The pictogram of a caution. It stands beside its words, so it is hidden from assistive technology. */
export function CautionSign({ sign, size = 32 }: { sign: CautionSignName; size?: number }) {
  const { lines, filled } = DRAWINGS[sign];
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" className="flex-none" aria-hidden="true">
      <path
        d={lines}
        fill="none"
        stroke="currentColor"
        strokeWidth="1.6"
        strokeLinejoin="round"
        strokeLinecap="round"
      />
      {filled && <path d={filled} fill="currentColor" />}
    </svg>
  );
}

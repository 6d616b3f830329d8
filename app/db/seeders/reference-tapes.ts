import type { Resistance } from "#app/engine/flow/handling-inputs.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { SourceKind } from "#app/engine/vocabulary.ts";
import { BLANK_TAPE_HANDLING } from "#app/lib/blank-handling.ts";
import type { TapeKind } from "#app/lib/tape-kinds.ts";
import type { TapeHandlingValues } from "#app/schemas/library-handling.ts";
import { celsius, measured } from "./measured.ts";

/** A tape as it is seeded. */
interface SeedTape {
  name: string;
  kind: TapeKind;
  note: string;
  thickness: Measured | null;
  temperatureLimit: Measured | null;
  embeddingDepth: Measured | null;
  thicknessVariation: Measured | null;
  longestTime: Measured | null;
  handling: TapeHandlingValues;
  handlingSource: SourceKind;
}

const um = 1e-6;
const DAY = 86_400;
const practice = (value: number, tolerance: number | null = null) =>
  measured(value, tolerance, "assumed", "common practice, no source");
const resists: Resistance = { word: "resists" };
const attacked: Resistance = { word: "attacked" };

interface Sketch {
  name: string;
  kind: TapeKind;
  /** µm */
  thickness: number;
  /** °C */
  limit: number;
  /** µm */
  embedding: number;
  /** µm */
  variation: number;
  /** days; null: the site's red line */
  days: number | null;
  handling: Partial<TapeHandlingValues>;
}

const sketch = ({ name, kind, thickness, limit, embedding, variation, days, handling }: Sketch): SeedTape => ({
  name,
  kind,
  note: "Ranges of the trade: put your own tape's data in its place.",
  thickness: practice(thickness * um, 0.1 * thickness * um),
  temperatureLimit: practice(celsius(limit)),
  embeddingDepth: practice(embedding * um),
  thicknessVariation: practice(variation * um),
  longestTime: days === null ? null : practice(days * DAY),
  handling: { ...BLANK_TAPE_HANDLING, ...handling },
  handlingSource: "assumed",
});

/** Kinds of tape as the trade has them; no product stands behind any of them. */
export const REFERENCE_TAPES: SeedTape[] = [
  sketch({
    name: "Grinding tape, ultraviolet release",
    kind: "grinding tape",
    thickness: 130,
    limit: 60,
    embedding: 0,
    variation: 2,
    days: null,
    handling: { releasesInLight: true, solvent: attacked },
  }),
  sketch({
    name: "Grinding tape for bumps, ultraviolet release",
    kind: "grinding tape",
    thickness: 400,
    limit: 80,
    embedding: 200,
    variation: 4,
    days: null,
    handling: { releasesInLight: true, solvent: attacked },
  }),
  sketch({
    name: "Dicing tape, pressure-sensitive",
    kind: "dicing tape",
    thickness: 80,
    limit: 60,
    embedding: 0,
    variation: 3,
    days: 7,
    handling: { releasesInLight: false, solvent: attacked },
  }),
  sketch({
    name: "Dicing tape, ultraviolet release",
    kind: "dicing tape",
    thickness: 100,
    limit: 80,
    embedding: 0,
    variation: 3,
    days: 14,
    handling: { releasesInLight: true },
  }),
  sketch({
    name: "Dicing tape for heat and vacuum",
    kind: "dicing tape",
    thickness: 120,
    limit: 150,
    embedding: 0,
    variation: 3,
    days: 7,
    handling: {
      releasesInLight: false,
      vacuum: { word: "resists", longest: 1800 },
      plasma: { word: "resists", longest: 300 },
      solvent: resists,
      attackedBy: ["ketone", "polar aprotic"],
    },
  }),
];

/** Tapes of the invented pilot line. */
export const DEMO_TAPES: SeedTape[] = [
  {
    name: "Bump-embedding grinding tape A",
    kind: "grinding tape",
    note: "",
    thickness: null,
    temperatureLimit: measured(celsius(80), null, "supplier"),
    embeddingDepth: measured(200e-6, 10e-6, "supplier"),
    thicknessVariation: measured(3e-6, null, "supplier"),
    longestTime: null,
    handling: { ...BLANK_TAPE_HANDLING, releasesInLight: true },
    handlingSource: "supplier",
  },
  {
    name: "Dicing tape A",
    kind: "dicing tape",
    note: "",
    thickness: null,
    temperatureLimit: measured(celsius(80), null, "supplier"),
    embeddingDepth: null,
    thicknessVariation: null,
    longestTime: null,
    handling: { ...BLANK_TAPE_HANDLING, releasesInLight: true },
    handlingSource: "supplier",
  },
];

import type { StepKind } from "#app/engine/flow/model.ts";
import type { Exposure, Holding, Side } from "#app/engine/vocabulary.ts";

/** A film put down in the demo: µm and MPa. */
export interface DemoAddition {
  side: Side;
  film: string;
  thickness: number;
  stress: number;
  coverage: number;
}

/** A step of the demo: °C, minutes, µm, mm, N/m. What is left out does not happen. */
export interface DemoStep {
  kind: StepKind;
  title: string;
  peak: number;
  minutes?: number;
  equipment: string;
  exposures?: Exposure[];
  planned: Holding;
  silicon?: { thickness: number; tolerance: number };
  adds?: DemoAddition[];
  removes?: { side: Side; film: string }[];
  trim?: { width: number; depth: number };
  groundFaceForce?: number;
}

/** Program Tern: 200 mm, to 100 µm, redistribution layer and balls, on tape from the grind on. */
export const TERN_STEPS: DemoStep[] = [
  {
    kind: "receive",
    title: "Receive, 725 µm, fab back end on",
    peak: 25,
    equipment: "Cassette or box store 200 mm",
    planned: "bare",
    adds: [
      { side: "front", film: "Fab back-end equivalent film", thickness: 2.0, stress: 40, coverage: 1.0 },
      { side: "front", film: "Passivation nitride A", thickness: 0.8, stress: -100, coverage: 1.0 },
    ],
  },
  {
    kind: "measure",
    title: "Incoming bow and warp",
    peak: 25,
    equipment: "Interferometer or profilometer",
    planned: "bare",
  },
  {
    kind: "cure",
    title: "Coat and cure polymer dielectric 1, 5 µm",
    peak: 230,
    minutes: 120,
    equipment: "Polymer cure oven",
    exposures: ["nitrogen"],
    planned: "bare",
    adds: [{ side: "front", film: "Polymer dielectric A", thickness: 5, stress: 30, coverage: 0.95 }],
  },
  {
    kind: "deposit",
    title: "Sputter barrier and seed, 0.3 µm",
    peak: 100,
    minutes: 3,
    equipment: "Sputter, electrostatic or clamp chuck",
    exposures: ["vacuum", "plasma"],
    planned: "bare",
    adds: [
      {
        side: "front",
        film: "Barrier and seed A (titanium-tungsten 0.1 µm + copper 0.2 µm)",
        thickness: 0.3,
        stress: -150,
        coverage: 1.0,
      },
    ],
  },
  {
    kind: "pattern",
    title: "Coat, expose, develop resist",
    peak: 110,
    minutes: 3,
    equipment: "Coat and develop track",
    exposures: ["solvent", "base"],
    planned: "bare",
  },
  {
    kind: "plate",
    title: "Plate redistribution copper, 5 µm, 35 %",
    peak: 25,
    equipment: "Single-wafer wet or plating",
    exposures: ["acid"],
    planned: "bare",
    adds: [{ side: "front", film: "Plated copper A", thickness: 5, stress: 20, coverage: 0.35 }],
  },
  {
    kind: "clean",
    title: "Strip resist, etch seed between lines",
    peak: 60,
    minutes: 10,
    equipment: "Single-wafer wet or plating",
    exposures: ["solvent", "acid"],
    planned: "bare",
    adds: [
      {
        side: "front",
        film: "Barrier and seed A (titanium-tungsten 0.1 µm + copper 0.2 µm)",
        thickness: 0.3,
        stress: -150,
        coverage: 0.35,
      },
    ],
    removes: [{ side: "front", film: "Barrier and seed A (titanium-tungsten 0.1 µm + copper 0.2 µm)" }],
  },
  {
    kind: "cure",
    title: "Coat and cure polymer dielectric 2, 7 µm",
    peak: 230,
    minutes: 120,
    equipment: "Polymer cure oven",
    exposures: ["nitrogen"],
    planned: "bare",
    adds: [{ side: "front", film: "Polymer dielectric A", thickness: 7, stress: 30, coverage: 0.92 }],
  },
  {
    kind: "plate",
    title: "Pad metal, 5 µm, 8 %",
    peak: 50,
    minutes: 30,
    equipment: "Single-wafer wet or plating",
    exposures: ["acid"],
    planned: "bare",
    adds: [{ side: "front", film: "Nickel pad metal A", thickness: 5, stress: 150, coverage: 0.08 }],
  },
  {
    kind: "reflow",
    title: "Ball attach and reflow, 130 µm high",
    peak: 245,
    minutes: 1,
    equipment: "Reflow oven, belt or plate",
    exposures: ["flux", "nitrogen"],
    planned: "bare",
  },
  {
    kind: "measure",
    title: "Wafer-level test and bow",
    peak: 25,
    equipment: "Interferometer or profilometer",
    planned: "bare",
  },
  {
    kind: "edge trim",
    title: "Edge trim 0.7 mm wide, 150 µm deep from device side",
    peak: 25,
    equipment: "Edge trimmer",
    exposures: ["water"],
    planned: "bare",
    trim: { width: 0.7, depth: 150 },
  },
  {
    kind: "laminate tape",
    title: "Laminate bump-embedding grinding tape, 200 µm embedding layer",
    peak: 60,
    minutes: 1,
    equipment: "Tape laminator",
    planned: "grinding tape",
  },
  {
    kind: "grind",
    title: "Grind to 110 µm",
    peak: 25,
    equipment: "Grinder and polisher",
    exposures: ["water"],
    planned: "grinding tape",
    silicon: { thickness: 110, tolerance: 3 },
    groundFaceForce: -60,
  },
  {
    kind: "stress relief",
    title: "Dry polish to 100 µm",
    peak: 25,
    equipment: "Grinder and polisher",
    exposures: ["water"],
    planned: "grinding tape",
    silicon: { thickness: 100, tolerance: 3 },
    groundFaceForce: -5,
  },
  {
    kind: "mount on frame",
    title: "Mount on film frame in line, peel grinding tape",
    peak: 60,
    minutes: 1,
    equipment: "Frame mounter",
    planned: "film frame",
  },
  {
    kind: "measure",
    title: "Inspect and mark on frame",
    peak: 25,
    equipment: "Frame store",
    planned: "film frame",
  },
  {
    kind: "dice",
    title: "Dice, two-step blade",
    peak: 25,
    equipment: "Dicer",
    exposures: ["water"],
    planned: "film frame",
  },
  {
    kind: "store",
    title: "Store diced on frame",
    peak: 25,
    equipment: "Frame store",
    planned: "film frame",
  },
];

import { bondTitle, type DemoAddition, type DemoBond, type DemoStep } from "./demo-step.ts";
import { celsius, measured } from "./measured.ts";

interface TwoBonds {
  /** of the device side, let go first */
  first: DemoBond;
  /** of the back side */
  second: DemoBond;
}

const SEED = "Barrier and seed A (titanium-tungsten 0.1 µm + copper 0.2 µm)";
const seed = (side: DemoAddition["side"], coverage: number): DemoAddition => ({
  side,
  film: SEED,
  thickness: 0.3,
  stress: -150,
  coverage,
});

/** Copper lines on one side of a wafer that is on a carrier. */
const lines = (side: DemoAddition["side"], words: string): DemoStep[] => [
  {
    kind: "deposit",
    title: `Sputter barrier and seed on the ${words}`,
    handling: { dehydrationBake: true },
    peak: 100,
    minutes: 3,
    equipment: "Sputter, electrostatic or clamp chuck",
    exposures: ["vacuum", "plasma"],
    planned: "carrier",
    adds: [seed(side, 1)],
  },
  {
    kind: "pattern",
    title: `Coat, expose, develop resist on the ${words}`,
    peak: 110,
    minutes: 3,
    equipment: "Mask aligner or stepper",
    exposures: ["solvent", "base"],
    planned: "carrier",
  },
  {
    kind: "plate",
    title: `Plate copper on the ${words}, 4 µm, 30 %`,
    peak: 25,
    equipment: "Single-wafer wet or plating",
    exposures: ["acid"],
    planned: "carrier",
    adds: [{ side, film: "Plated copper A", thickness: 4, stress: 20, coverage: 0.3 }],
  },
  {
    kind: "clean",
    title: `Strip resist, etch seed on the ${words}`,
    ...(side === "front" ? { handling: { topography: measured(4e-6, 0.5e-6, "measured here") } } : {}),
    peak: 60,
    minutes: 10,
    equipment: "Single-wafer wet or plating",
    exposures: ["solvent", "acid"],
    planned: "carrier",
    adds: [seed(side, 0.3)],
    removes: [{ side, film: SEED }],
  },
];

const DICING_TAPE = {
  tapeName: "Dicing tape",
  tapeTemperatureLimit: measured(celsius(80), null, "supplier"),
  tapeReleasesInLight: true,
  tapeSolvent: "unknown",
} as const;

/**
 * 300 mm, to 50 µm with copper lines on both sides: on one carrier by the device side while the back side is worked on, then on
 * another by the back side while the device side is.
 */
export const twoCarrierSteps = ({ first, second }: TwoBonds): DemoStep[] => [
  {
    kind: "receive",
    title: "Receive, 775 µm, fab back end on",
    peak: 25,
    equipment: "Cassette or box store 300 mm",
    planned: "bare",
    adds: [{ side: "front", film: "Fab back-end equivalent film", thickness: 4, stress: 35, coverage: 1 }],
  },
  {
    kind: "measure",
    title: "Incoming bow and warp",
    peak: 25,
    equipment: "Interferometer or profilometer",
    planned: "bare",
  },
  {
    kind: "edge trim",
    title: "Edge trim 0.8 mm wide, 100 µm deep from device side",
    peak: 25,
    equipment: "Edge trimmer",
    exposures: ["water"],
    planned: "bare",
    trim: { width: 0.8, depth: 100 },
  },
  {
    kind: "bond",
    title: bondTitle(first),
    handling: { dehydrationBake: true },
    peak: first.peak,
    minutes: 5,
    equipment: "Wafer bonder",
    exposures: ["vacuum"],
    planned: "carrier",
    bond: first,
  },
  {
    kind: "grind",
    title: "Grind to 60 µm",
    handling: { thicknessVariation: measured(1e-6, null, "measured here"), timeSincePrevious: 12 * 3600 },
    peak: 25,
    equipment: "Grinder and polisher",
    exposures: ["water"],
    planned: "carrier",
    silicon: { thickness: 60, tolerance: 3 },
    groundFaceForce: -60,
  },
  {
    kind: "stress relief",
    title: "Polish to 50 µm",
    handling: { thicknessVariation: measured(0.5e-6, null, "measured here"), timeSincePrevious: 3600 },
    peak: 25,
    equipment: "Grinder and polisher",
    exposures: ["water"],
    planned: "carrier",
    silicon: { thickness: 50, tolerance: 3 },
    groundFaceForce: -5,
  },
  {
    kind: "back-side film",
    title: "Back-side oxide 0.5 µm, plasma deposition",
    handling: { dehydrationBake: true },
    peak: 180,
    minutes: 4,
    equipment: "Plasma deposition, electrostatic chuck",
    exposures: ["vacuum", "plasma"],
    planned: "carrier",
    adds: [{ side: "back", film: "Back-side oxide A (low temperature)", thickness: 0.5, stress: -120, coverage: 1 }],
  },
  ...lines("back", "back side"),
  {
    kind: "bond",
    title: `${bondTitle(second)}, by the back side`,
    handling: { dehydrationBake: true, bondFace: "back" },
    peak: second.peak,
    minutes: 5,
    equipment: "Wafer bonder",
    exposures: ["vacuum"],
    planned: "carrier",
    bond: second,
  },
  {
    kind: "debond",
    title: `${first.debond.title}: device side`,
    handling: { debondFace: "front" },
    peak: first.debond.peak,
    equipment: "Debonder",
    planned: "carrier",
  },
  {
    kind: "clean",
    title: "Remove adhesive from the device side",
    handling: { solvent: "bonding material remover", exposureTimes: { solvent: 600 }, timeSincePrevious: 3600 },
    peak: 30,
    minutes: 10,
    equipment: "Single-wafer wet or plating",
    exposures: ["solvent"],
    planned: "carrier",
  },
  ...lines("front", "device side"),
  {
    kind: "measure",
    title: "Pair bow, thickness variation, voids",
    peak: 25,
    equipment: "Interferometer or profilometer",
    planned: "carrier",
  },
  {
    kind: "mount on frame",
    title: "Mount device side on film frame",
    handling: { timeSincePrevious: 4 * 3600, ...DICING_TAPE },
    peak: 25,
    equipment: "Frame mounter",
    planned: "carrier",
  },
  {
    kind: "debond",
    title: `${second.debond.title}: back side`,
    handling: { debondFace: "back" },
    peak: second.debond.peak,
    equipment: "Debonder",
    planned: "film frame",
  },
  {
    kind: "clean",
    title: "Remove adhesive from the back side, on frame",
    handling: { solvent: "bonding material remover", exposureTimes: { solvent: 600 }, timeSincePrevious: 3600 },
    peak: 30,
    minutes: 10,
    equipment: "Frame cleaner",
    exposures: ["solvent"],
    planned: "film frame",
  },
  {
    kind: "mount on frame",
    title: "Move to a second frame, device side up",
    handling: { inLine: true, ...DICING_TAPE },
    peak: 25,
    equipment: "Frame mounter",
    planned: "film frame",
  },
  {
    kind: "dice",
    title: "Dice on frame",
    peak: 25,
    equipment: "Dicer",
    exposures: ["water"],
    planned: "film frame",
  },
  {
    kind: "store",
    title: "Store on frame",
    peak: 25,
    equipment: "Frame store",
    planned: "film frame",
  },
];

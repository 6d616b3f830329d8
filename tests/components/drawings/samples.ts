import type { CutLayer } from "#app/components/drawings/cut-layer.ts";
import type { StripStep } from "#app/components/drawings/strip-step.ts";
import type { WarpPlotInput } from "#app/components/drawings/warp-plot.ts";

/** Drawn samples after the invented Petrel and Tern programs; their numbers stand for nothing but their shape. */
export const LAYERS: readonly CutLayer[] = [
  {
    role: "film",
    kind: "metal",
    thickness: 5e-6,
    thicknessText: "5 µm",
    stress: 118e6,
    coverage: 0.38,
    name: "Copper redistribution",
    notes: ["+118 MPa tension", "measured 2026-11-18"],
    selected: true,
  },
  {
    role: "film",
    kind: "inorganic",
    thickness: 0.8e-6,
    thicknessText: "0.8 µm",
    stress: -150e6,
    name: "Passivation nitride",
    notes: ["−150 MPa compression"],
    assumed: true,
  },
  {
    role: "silicon",
    kind: "silicon",
    thickness: 50e-6,
    thicknessText: "50 µm",
    name: "Silicon (001), 300 mm",
    notes: ["ground from 775 µm"],
  },
  { role: "film", kind: "polymer", thickness: 8e-6, thicknessText: "8 µm", name: "Polymer dielectric A", notes: [] },
  { role: "film", kind: "solder", thickness: 20e-6, thicknessText: "20 µm", name: "Solder, tin silver", notes: [] },
  {
    role: "adhesive",
    kind: "adhesive",
    thickness: 40e-6,
    thicknessText: "40 µm",
    name: "Laser-release adhesive B",
    notes: ["supplier"],
  },
  {
    role: "carrier",
    kind: "glass",
    thickness: 700e-6,
    thicknessText: "700 µm",
    name: "Glass carrier 3.0 ppm",
    notes: ["supplier"],
  },
];

export const STEPS: readonly StripStep[] = [
  {
    number: 1,
    shortName: "Incoming",
    name: "Incoming bow and warp",
    silicon: { thickness: 775e-6, text: "775" },
    temperature: { peak: 298.15, text: "25" },
    bow: { shape: { kind: "bowed", bow: 92e-6 }, deviceSideUp: true, holding: "bare" },
    warp: { fraction: 0.09, uncertainty: 0.02 },
    required: "bare",
    planned: null,
    outcome: "clear",
    href: "?step=1",
  },
  {
    number: 2,
    shortName: "Bond",
    name: "Bond to glass carrier",
    silicon: { thickness: 775e-6, text: "775" },
    temperature: { peak: 453.15, text: "180" },
    bow: { shape: { kind: "bowed", bow: 426e-6 }, deviceSideUp: false, holding: "carrier" },
    warp: { fraction: 1.42, uncertainty: 0.1 },
    required: "bare",
    planned: "Glass carrier 3.3 ppm",
    outcome: "do not run",
    selected: true,
    href: "?step=2",
  },
  {
    number: 3,
    shortName: "Polish",
    name: "Polish to 50 µm",
    silicon: { thickness: 50e-6, text: "50" },
    temperature: { peak: 298.15, text: "25" },
    bow: { shape: { kind: "rolled", radius: 0.26, edgesUp: true }, deviceSideUp: false, holding: "carrier" },
    warp: { fraction: 0.3, uncertainty: 0.05 },
    required: "carrier",
    planned: "Glass carrier 3.3 ppm",
    outcome: "cannot judge",
    href: "?step=3",
  },
  {
    number: 4,
    shortName: "Dice",
    name: "Dice on frame",
    silicon: { thickness: 50e-6, text: "50" },
    temperature: { peak: 298.15, text: "25" },
    bow: { shape: { kind: "held" }, deviceSideUp: true, holding: "film frame" },
    warp: null,
    required: "tape or ring",
    planned: "film frame",
    outcome: "clear",
    href: "?step=4",
  },
];

const thicknesses = Array.from({ length: 60 }, (_, index) => 20e-6 * (775 / 20) ** (index / 59));

export const WARP: WarpPlotInput = {
  series: [
    {
      id: "drawn",
      label: "as drawn, 25 °C",
      dash: "solid",
      marker: "circle",
      colourToken: "silicon",
      points: thicknesses.map((x) => ({ x, y: 1.1e-2 * (100e-6 / x) ** 2 })),
    },
    {
      id: "linear",
      label: "linear",
      dash: "reference",
      marker: "none",
      colourToken: "silicon",
      labelled: "along",
      points: thicknesses.map((x) => ({ x, y: 0.8e-2 * (100e-6 / x) ** 2 })),
    },
  ],
  thicknessLimits: [
    { value: 50e-6, lines: ["carrier", "below 50"] },
    { value: 150e-6, lines: ["tape or ring", "below 150"] },
  ],
  warpLimits: [{ value: 300e-6, lines: ["coater, 300 µm"] }],
  curling: { thickness: 307e-6, label: "curls below 307 µm" },
  chosenThickness: 100e-6,
  formatThickness: (metres) => `${Math.round(metres * 1e6)} µm`,
  formatWarp: (metres) => `${(metres * 1e3).toFixed(1)} mm`,
};

import type { QuantityRule } from "#app/lib/read-quantity.ts";

/**
 * The quantities that people type, with the widest range that makes sense of each: beyond it the value is a slip. Ranges of the
 * trade are narrower and only warn.
 */
export const RULES = {
  filmThickness: {
    label: "film thickness",
    dimension: "length",
    range: { least: 1e-9, most: 1e-3, words: "1 nm to 1 mm" },
  },
  siliconThickness: {
    label: "silicon thickness",
    dimension: "length",
    range: { least: 1e-6, most: 2e-3, words: "1 µm to 2 mm" },
  },
  carrierThickness: {
    label: "carrier thickness",
    dimension: "length",
    range: { least: 1e-4, most: 5e-3, words: "0.1 mm to 5 mm" },
  },
  bondThickness: {
    label: "bond thickness",
    dimension: "length",
    range: { least: 1e-7, most: 5e-4, words: "0.1 µm to 500 µm" },
  },
  diameter: { label: "diameter", dimension: "length", range: { least: 0.025, most: 0.46, words: "25 mm to 460 mm" } },
  warpLimit: { label: "warp limit", dimension: "length", range: { least: 1e-6, most: 0.02, words: "1 µm to 20 mm" } },
  thicknessVariation: {
    label: "thickness variation",
    dimension: "length",
    range: { least: 0, most: 1e-4, words: "0 to 100 µm" },
  },
  trimWidth: { label: "trim width", dimension: "length", range: { least: 1e-5, most: 0.01, words: "10 µm to 10 mm" } },
  trimDepth: { label: "trim depth", dimension: "length", range: { least: 1e-6, most: 2e-3, words: "1 µm to 2 mm" } },
  rim: { label: "rim left out", dimension: "length", range: { least: 0, most: 0.05, words: "0 to 50 mm" } },
  stress: { label: "stress", dimension: "stress", range: { least: -1e10, most: 1e10, words: "−10 GPa to 10 GPa" } },
  yieldStress: {
    label: "yield stress",
    dimension: "stress",
    range: { least: 1e5, most: 1e10, words: "0.1 MPa to 10 GPa" },
  },
  modulus: { label: "modulus", dimension: "stress", range: { least: 1e4, most: 1.5e12, words: "10 kPa to 1500 GPa" } },
  poissonsRatio: {
    label: "Poisson’s ratio",
    dimension: "number",
    range: { least: 0, most: 0.499, words: "0 to 0.499" },
  },
  expansion: {
    label: "expansion",
    dimension: "expansion",
    range: { least: -2e-5, most: 1e-3, words: "−20 ppm/K to 1000 ppm/K" },
  },
  temperature: {
    label: "temperature",
    dimension: "temperature",
    range: { least: 150, most: 1473.15, words: "−123 °C to 1200 °C" },
  },
  density: {
    label: "density",
    dimension: "density",
    range: { least: 100, most: 30_000, words: "100 kg/m³ to 30 000 kg/m³" },
  },
  coverage: {
    label: "area coverage",
    dimension: "fraction",
    range: { least: 1e-4, most: 1, words: "0.01 % to 100 %" },
  },
  lineWidth: {
    label: "width of the lines",
    dimension: "length",
    range: { least: 1e-8, most: 0.05, words: "10 nm to 50 mm" },
  },
  lineDirection: {
    label: "direction of the lines",
    dimension: "angle",
    range: { least: -Math.PI, most: Math.PI, words: "−180° to 180°" },
  },
  share: { label: "share", dimension: "fraction", range: { least: 0, most: 1, words: "0 to 100 %" } },
  holdTime: { label: "time at peak", dimension: "time", range: { least: 0, most: 2_592_000, words: "0 to 30 days" } },
  featureHeight: {
    label: "height",
    dimension: "length",
    range: { least: 0, most: 1e-3, words: "0 to 1 mm" },
  },
  embeddingDepth: {
    label: "embedding layer of the tape",
    dimension: "length",
    range: { least: 0, most: 2e-3, words: "0 to 2 mm" },
  },
  tapeThickness: {
    label: "thickness of the tape",
    dimension: "length",
    range: { least: 1e-6, most: 3e-3, words: "1 µm to 3 mm" },
  },
  peelForce: {
    label: "peel force",
    dimension: "forcePerLength",
    range: { least: 0, most: 5000, words: "0 to 5000 N/m" },
  },
  timeOnTape: {
    label: "time on tape",
    dimension: "time",
    range: { least: 0, most: 31_536_000, words: "0 to 365 days" },
  },
  bow: { label: "bow", dimension: "length", range: { least: -0.02, most: 0.02, words: "−20 mm to 20 mm" } },
  curvature: {
    label: "curvature",
    dimension: "curvature",
    range: { least: -20, most: 20, words: "−20 1/m to 20 1/m" },
  },
  bowUncertainty: {
    label: "standard uncertainty",
    dimension: "length",
    range: { least: 1e-8, most: 0.02, words: "10 nm to 20 mm" },
  },
  warp: { label: "warp", dimension: "length", range: { least: 0, most: 0.02, words: "0 to 20 mm" } },
  faceForce: {
    label: "ground face force",
    dimension: "forcePerLength",
    range: { least: -5000, most: 5000, words: "−5000 N/m to 5000 N/m" },
  },
  gap: { label: "gap", dimension: "length", range: { least: 0, most: 0.02, words: "0 to 20 mm" } },
  pairThickness: {
    label: "thickness",
    dimension: "length",
    range: { least: 1e-5, most: 0.02, words: "10 µm to 20 mm" },
  },
  weight: { label: "weight", dimension: "mass", range: { least: 1e-3, most: 10, words: "1 g to 10 kg" } },
  bendRadius: {
    label: "bend radius",
    dimension: "length",
    range: { least: 1e-4, most: 10, words: "0.1 mm to 10 m" },
  },
  exposureTime: { label: "time", dimension: "time", range: { least: 1, most: 2_592_000, words: "1 s to 30 days" } },
} as const satisfies Record<string, QuantityRule>;

import type { FilmChoice, SiliconChoice, StackChoices } from "#app/lib/stack-draft.ts";
import type { LayerText, StackText } from "#app/lib/stack-text.ts";

/** Films and silicon after the invented Tern program. */
export const COPPER: FilmChoice = {
  id: "5f6b2f0a-8c55-4b0e-9d5e-1c6a3f7d0a01",
  name: "Plated copper A",
  kind: "metal",
  stress: { value: 20e6, tolerance: 3e6, source: "measured here", note: "", on: "2026-10-21" },
  youngsModulus: 117e9,
  poissonsRatio: 0.34,
  expansion: 16.7e-6,
};
export const POLYMER: FilmChoice = {
  id: "5f6b2f0a-8c55-4b0e-9d5e-1c6a3f7d0a02",
  name: "Polymer dielectric A",
  kind: "polymer",
  stress: { value: 30e6, tolerance: 3e6, source: "assumed", note: "", on: null },
  youngsModulus: 3e9,
  poissonsRatio: 0.35,
  expansion: 42e-6,
};
export const WAFER: SiliconChoice = {
  id: "5f6b2f0a-8c55-4b0e-9d5e-1c6a3f7d0b01",
  name: "Silicon (001), 200 mm, 725 µm",
  orientation: "100",
  diameter: 0.2,
  thickness: 725e-6,
};
export const CHOICES: StackChoices = { films: [COPPER, POLYMER], silicon: [WAFER] };

/** A form of before films could be cut in lines says it by the coverage alone. */
const NOT_SAID = { cut: "", lineWidth: "", lineDirection: "" };

export const layerText = (changes: Partial<LayerText>): LayerText => ({
  side: "front",
  film: COPPER.id,
  thickness: { value: "5 um", source: "measured here" },
  stress: {},
  ...NOT_SAID,
  coverage: "100 %",
  ...changes,
});

/** A polymer on copper on the device side, a thin polymer on the back. */
export const TEXT: StackText = {
  program: "5f6b2f0a-8c55-4b0e-9d5e-1c6a3f7d0c01",
  name: "Tern T-9, trial",
  note: "",
  silicon: WAFER.id,
  siliconThickness: { value: "250 µm", tolerance: "3 µm", source: "supplier" },
  layers: [
    layerText({ film: POLYMER.id, thickness: { value: "7 µm" }, coverage: "92 %" }),
    layerText({ stress: { value: "200 MPa", source: "measured here" }, coverage: "0.35" }),
    layerText({ side: "back", film: POLYMER.id, thickness: { value: "2 µm", source: "supplier" } }),
  ],
};

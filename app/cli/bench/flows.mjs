/** Value as stated, with a tolerance of so large a share of it. */
const stated = (value, share = 0) => ({
  value,
  tolerance: share === 0 ? null : Math.abs(value) * share,
  source: "assumed",
});

const tool = {
  id: "tool",
  name: "Tool",
  warpLimitEdgesUp: stated(1e-3),
  warpLimitEdgesDown: stated(1e-3),
  leastUnsupportedThickness: null,
  atPeak: "free",
  largestDiameter: stated(0.3),
};

/** A metal that yields on the way to 400 °C, each with a stress, modulus, expansion and yield stress of its own. */
const metal = (n) => ({
  id: `metal ${n}`,
  name: `Metal ${n}`,
  kind: "metal",
  youngsModulus: stated((90 + n) * 1e9, 0.05),
  poissonsRatio: stated(0.34),
  expansion: stated((14 + 0.1 * n) * 1e-6, 0.05),
  yieldStress: stated((150 + 2 * n) * 1e6, 0.1),
  temperatureLimit: null,
});

const addition = (n, thickness) => ({
  side: "front",
  film: metal(n),
  thickness: stated(thickness, 0.02),
  stress: stated((60 - 2 * (n % 30)) * 1e6, 0.1),
  coverage: 1,
});

const step = (title, peak, adds) => ({
  kind: adds.length > 0 ? "deposit" : "anneal",
  title,
  peakTemperature: 273.15 + peak,
  holdTime: null,
  equipment: tool,
  exposures: [],
  planned: "bare",
  siliconAfter: null,
  adds,
  removes: [],
  edgeTrim: null,
  bond: null,
  groundFaceForce: null,
});

/**
 * A flow of so many steps that puts down metals of 0.2 µm in its first ones, `together` in each, until there are so many, and heats
 * all of them to 200 to 400 °C from step to step; every number of theirs has a tolerance.
 *
 * @param {{ steps: number, films: number, together: number }} of
 */
export function metalFlow({ steps, films, together }) {
  const additions = Array.from({ length: films }, (_, n) => addition(n, 0.2e-6));
  return {
    name: "Bench",
    wafer: { name: "Wafer", diameter: 0.3, orientation: "100", thickness: stated(775e-6, 0.02) },
    steps: Array.from({ length: steps }, (_, n) =>
      step(`Step ${n + 1}`, 200 + 40 * ((3 * n) % 6), additions.slice(n * together, (n + 1) * together)),
    ),
  };
}

/**
 * `npm run bench`: how fast the engine samples, against NumPy doing the same in the same run, how long a chart's sweep, a flow's
 * sampling, walk and assessment take, how fast a scan of a million rows is read, and how large the part is that runs in the
 * browser. Prints a table; fails nothing, since times depend on the machine and what else it does.
 * Arguments name the parts to run, all of the engine's by default: 'npm run bench -- scans'. 'pages' measures a copy that runs.
 */
import { assessFlow } from "../../engine/flow/assess.ts";
import { walkFlow } from "../../engine/flow/walk.ts";
import { defaultLimits } from "../../engine/rules/limits.ts";
import { thicknessSweep } from "../../engine/stack/thickness-sweep.ts";
import { laminateModel } from "../../engine/uncertainty/laminate-model.ts";
import { stepsSampling } from "../../engine/uncertainty/sample-steps.ts";
import { sampleUncertainty } from "../../engine/uncertainty/sample-uncertainty.ts";
import { shapeCurve } from "../../engine/uncertainty/shape-curve.ts";
import { compareWithNumpy } from "./against-numpy.mjs";
import { bundleSize, FLOW_PAGE, LIVE, STACK_PAGE } from "./bundle.mjs";
import { inputsOf, stackOf } from "./cases.mjs";
import { metalFlow } from "./flows.mjs";
import { sweepInBrowser } from "./in-browser.mjs";
import { pages } from "./pages/pages.mjs";
import { scans } from "./scans.mjs";
import { shortest, slope } from "./timing.mjs";

async function sweep() {
  const films = [1, 2, 3, 4, 5, 6].map((n) => ({
    wafer: { diameter: 0.3, orientation: "100", thickness: 775e-6 },
    films: [
      { side: "front", thickness: 1e-6 * n, stress: 50e6 * n, youngsModulus: 70e9, poissonsRatio: 0.2 },
      { side: "back", thickness: 1e-6, stress: -80e6, youngsModulus: 70e9, poissonsRatio: 0.2 },
    ],
  }));
  const time = shortest(20, () => {
    for (const stack of films) thicknessSweep(stack, { from: 30e-6, to: 775e-6, points: 200 });
  });
  const ms = (seconds) => `${(1e3 * seconds).toFixed(1)} ms`;
  console.log(`Sweep of 200 thicknesses and 6 stacks, shape included: ${ms(time)} (wanted 16 ms)`);
  const browser = await sweepInBrowser(films);
  console.log(
    browser
      ? `    in Chromium, by the clock: ${ms(browser.least)}, the very first time ${ms(browser.first)}`
      : "    not measured in a browser: Chromium is not installed",
  );
}

/** A flow of so many steps on stacks of so many layers: the silicon's thickness differs from step to step, the films are the same. */
function flowOf(steps, count) {
  const shared = inputsOf(stackOf(count));
  const curve = shapeCurve({ radius: 0.15, youngsModulus: 130e9, poissonsRatio: 0.2786, crystal: "100" });
  const silicon = Array.from({ length: steps }, (_, n) => 775e-6 * 0.93 ** (n % 25));
  return {
    inputs: [
      ...shared,
      ...silicon.map((value, n) => ({
        name: `silicon after step ${n}`,
        value,
        distribution: "normal",
        standard: 1e-6,
      })),
    ],
    steps: silicon.map((thickness, n) => ({
      model: laminateModel(stackOf(count, thickness), { temperature: 298.15 + 10 * n }).shape(curve, "warp"),
      uses: shared.map((_, place) => (place === 0 ? shared.length + n : place)),
    })),
  };
}

function sampleFlow(steps, count, draws) {
  const flow = flowOf(steps, count);
  const run = stepsSampling({ ...flow, draws, seed: 1 });
  for (let step = run.next(); ; step = run.next()) if (step.done) return step.value;
}

function flow() {
  const time = shortest(5, () => sampleFlow(25, 12, 20_000));
  console.log(`Flow of 25 steps, 12 layers, 20000 draws, warp at every step: ${time.toFixed(2)} s (wanted 1 s)`);
  const growth = (sizes, work) =>
    slope(
      sizes,
      sizes.map((size) => shortest(3, () => work(size))),
    ).toFixed(2);
  const evaluations = 40_000;
  const layersSlope = growth([8, 16, 32, 64], (size) => {
    const stack = stackOf(size);
    sampleUncertainty({ model: laminateModel(stack).curvature, inputs: inputsOf(stack), draws: evaluations, seed: 1 });
  });
  const stepsSlope = growth([10, 20, 40, 80], (size) => sampleFlow(size, 12, 10_000));
  const stack = stackOf(10);
  const drawn = { model: laminateModel(stack).curvature, inputs: inputsOf(stack), seed: 1 };
  const drawsSlope = growth([20_000, 40_000, 80_000, 160_000], (draws) => sampleUncertainty({ ...drawn, draws }));
  console.log(`Growth of time (1 is linear): layers ${layersSlope}, steps ${stepsSlope}, draws ${drawsSlope}`);
}

function walks() {
  const limits = defaultLimits();
  const ms = (seconds) => `${(1e3 * seconds).toFixed(1)} ms`;
  const usual = metalFlow({ steps: 25, films: 11, together: 1 });
  const walk = shortest(100, () => walkFlow(usual, limits));
  console.log(`Walk of 25 steps, 12 layers, metals that yield: ${ms(walk)} (wanted 2 ms)`);
  const assess = shortest(10, () => assessFlow(usual, limits));
  console.log(`Assessment of the same with its uncertainties, 56 inputs: ${ms(assess)}`);
  const most = metalFlow({ steps: 12, films: 60, together: 10 });
  const heavy = shortest(3, () => assessFlow(most, limits));
  console.log(
    `Assessment of 12 steps and 60 metals that all yield, 301 inputs: ${ms(heavy)} (wanted well under 1000 ms)`,
  );
}

/** A flow as long as one may be: cost goes with steps as long as the stack does not grow. */
function longFlow() {
  const limits = defaultLimits();
  const sizes = [50, 100, 200, 300];
  const times = sizes.map((steps) => {
    const long = metalFlow({ steps, films: 11, together: 1 });
    return shortest(2, () => assessFlow(long, limits));
  });
  console.log(
    `Assessment of 300 steps, 12 layers, with its uncertainties: ${times.at(-1).toFixed(2)} s; growth of time with steps ${slope(sizes, times).toFixed(2)} (1 is linear)`,
  );
}

async function size() {
  const kB = (bytes) => `${(bytes / 1e3).toFixed(1)} kB`;
  for (const [what, parts] of [
    ["a stack's answer and sweep", STACK_PAGE],
    ["a flow's assessment", FLOW_PAGE],
    ["both", LIVE],
  ]) {
    const { gzip, plain, packages } = await bundleSize(parts);
    console.log(
      `Live part in the browser, ${what}, units and limits included: ${kB(gzip)} gzip (wanted 60 kB), ${kB(plain)} plain, ${packages.length} modules of packages`,
    );
  }
}

const PARTS = { sampling: compareWithNumpy, sweep, flow, walks, "long flow": longFlow, scans, size };
/** Measures a copy that runs already, so only when it is asked for. */
const ASKED_FOR = { pages };
const wanted = process.argv.slice(2);
const all = { ...PARTS, ...ASKED_FOR };
for (const part of wanted) if (!(part in all)) throw new Error(`The parts are ${Object.keys(all).join(", ")}.`);
for (const [name, part] of Object.entries(all))
  if (wanted.length === 0 ? name in PARTS : wanted.includes(name)) await part();

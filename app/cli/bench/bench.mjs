/**
 * `npm run bench`: how fast the engine samples, against NumPy doing the same in the same run, how long a chart's sweep, a flow's
 * sampling, walk and assessment take, and how large the part is that runs in the browser. Prints a table; fails nothing, since times depend on the machine and what else it does.
 */
import { assessFlow } from "../../engine/flow/assess.ts";
import { walkFlow } from "../../engine/flow/walk.ts";
import { defaultLimits } from "../../engine/rules/limits.ts";
import { thicknessSweep } from "../../engine/stack/thickness-sweep.ts";
import { BLOCK, plainDrawing } from "../../engine/uncertainty/drawing.ts";
import { laminateModel } from "../../engine/uncertainty/laminate-model.ts";
import { seededState } from "../../engine/uncertainty/random/generator.ts";
import { stepsSampling } from "../../engine/uncertainty/sample-steps.ts";
import { sampleUncertainty, sampling } from "../../engine/uncertainty/sample-uncertainty.ts";
import { shapeCurve } from "../../engine/uncertainty/shape-curve.ts";
import { sourcesOf } from "../../engine/uncertainty/sources.ts";
import { bundleSize, FLOW_PAGE, LIVE, STACK_PAGE } from "./bundle.mjs";
import { inputsOf, stackOf, uncertaintiesOf } from "./cases.mjs";
import { metalFlow } from "./flows.mjs";
import { sweepInBrowser } from "./in-browser.mjs";
import { needNumpy, numpyLaminate } from "./numpy.mjs";
import { scatter, shortest, slope } from "./timing.mjs";

const DRAWS = 2 ** 20;
const ROUNDS = 3;

const layers = stackOf(10);
const inputs = inputsOf(layers);
const { curvature } = laminateModel(layers);

/** Nanoseconds per draw of drawing, evaluating and keeping, and of evaluating alone. */
function ownTimes() {
  const draws = DRAWS / 4;
  const all = shortest(3, () => {
    const run = sampling({ model: curvature, inputs, draws, seed: 1 });
    // Up to the last draw: the summary comes with the next call and is timed elsewhere.
    for (let step = run.next(); !step.done && step.value.done < draws; step = run.next());
  });
  const block = new Float64Array(BLOCK * inputs.length);
  const out = new Float64Array(BLOCK);
  plainDrawing(sourcesOf(inputs, []), seededState(1))(block, BLOCK);
  const blocks = 2000;
  const arithmetic = shortest(10, () => {
    for (let n = 0; n < blocks; n += 1) curvature.evaluate(block, BLOCK, out);
  });
  return { nsPerDraw: (1e9 * all) / draws, nsArithmetic: (1e9 * arithmetic) / (blocks * BLOCK) };
}

const sample = (method, draws, seed) => {
  const found = sampleUncertainty({ model: curvature, inputs, draws, seed, method });
  return { mean: found.mean, high: found.quantile(0.95) };
};

/** What a method reaches with so many draws: standard errors from the scatter of runs with seeds of their own, and time. */
function reach(method, draws) {
  const runs = Array.from({ length: 24 }, (_, seed) => sample(method, draws, 100 + seed));
  return {
    draws,
    errorOfMean: scatter(runs.map(({ mean }) => mean)),
    errorOfHigh: scatter(runs.map(({ high }) => high)),
    seconds: shortest(5, () => sample(method, draws, 1)),
  };
}

/** Fewest draws of a method, in powers of two, that are as good as NumPy's in both. */
function asGoodAs(method, { errorOfMean, errorOfHigh }) {
  let found = reach(method, 2 ** 12);
  while ((found.errorOfMean > errorOfMean || found.errorOfHigh > errorOfHigh) && found.draws < DRAWS)
    found = reach(method, found.draws * 2);
  return found;
}

function compare() {
  const missing = needNumpy();
  if (missing) {
    console.log(missing);
    const own = ownTimes();
    console.log(`Draws: ${own.nsPerDraw.toFixed(0)} ns each, arithmetic ${own.nsArithmetic.toFixed(0)} ns.`);
    return;
  }
  const u = uncertaintiesOf(layers);
  const given = {
    thickness: layers.map(({ thickness }) => thickness),
    modulus: layers.map(({ youngsModulus }) => youngsModulus),
    stress: layers.map(({ stress }) => stress),
    poisson: layers.map(({ poissonsRatio }) => poissonsRatio),
    u_thickness: u.thickness,
    u_modulus: u.modulus,
    u_stress: u.stress,
    draws: DRAWS,
    chunks: [1000, 2000, 4000, 8000, 16000],
  };
  // In turn, so that a busy moment of the machine does not fall on one side alone.
  const rounds = Array.from({ length: ROUNDS }, () => ({ own: ownTimes(), numpy: numpyLaminate(given) }));
  const least = (pick) => Math.min(...rounds.map(pick));
  const numpy = rounds[0].numpy;
  const total = { own: least(({ own }) => own.nsPerDraw), numpy: least((round) => round.numpy.nsPerDraw) };
  const sums = { own: least(({ own }) => own.nsArithmetic), numpy: least((round) => round.numpy.nsArithmetic) };
  const seconds = least((round) => round.numpy.seconds);
  const row = (name, own, other, ratio, wanted) =>
    console.log([name.padEnd(46), own, other, ratio, wanted].join(" | "));
  console.log(
    `Processor time. Laminate of 10 layers, 30 normal inputs, one thread; NumPy ${numpy.version}, ${numpy.layout}, chunks of ${numpy.chunk}`,
  );
  row("", "engine     ", "NumPy      ", "ratio ", "wanted");
  const rate = (ns) => `${(1e3 / ns).toFixed(2)} M/s`.padEnd(11);
  const times = (ratio) => ratio.toFixed(2).padEnd(6);
  row(
    "draws a second, sampling included",
    rate(total.own),
    rate(total.numpy),
    times(total.numpy / total.own),
    "1 or more",
  );
  row("draws a second, arithmetic alone", rate(sums.own), rate(sums.numpy), times(sums.numpy / sums.own), "2 or more");
  const ms = (value) => `${(1e3 * value).toFixed(1)} ms`.padEnd(11);
  row(
    `mean and 95 % point of ${DRAWS} plain draws`,
    ms(shortest(3, () => sample("plain", DRAWS, 1))),
    ms(seconds),
    "",
    "",
  );
  const check = sample("lattice", 2 ** 18, 1);
  const off = (own, other, error) => `${(Math.abs(own - other) / error).toFixed(1)}`;
  console.log(
    `    the two agree: mean ${off(check.mean, numpy.mean, numpy.errorOfMean)}, 95 % point ${off(check.high, numpy.high, numpy.errorOfHigh)} standard errors apart`,
  );
  for (const method of ["control variate", "lattice"]) {
    const found = asGoodAs(method, numpy);
    const reached = found.errorOfMean <= numpy.errorOfMean && found.errorOfHigh <= numpy.errorOfHigh;
    const name = reached
      ? `as good by ${method}, ${found.draws} draws`
      : `${method} not as good at ${found.draws} draws`;
    row(name, ms(found.seconds), ms(seconds), times(found.seconds / seconds), "0.2 or less");
    console.log(
      `    standard error of mean ${found.errorOfMean.toExponential(1)} (${numpy.errorOfMean.toExponential(1)}), of 95 % point ${found.errorOfHigh.toExponential(1)} (${numpy.errorOfHigh.toExponential(1)})`,
    );
  }
}

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
  const drawsSlope = growth([20_000, 40_000, 80_000, 160_000], (draws) =>
    sampleUncertainty({ model: curvature, inputs, draws, seed: 1 }),
  );
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

compare();
await sweep();
flow();
walks();
await size();

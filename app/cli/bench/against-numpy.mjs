/**
 * The engine's sampling of a laminate against NumPy doing the same, and what variance reduction gains.
 *
 * Both are timed in turn, several times, and what counts is the median of the ratios of neighbours: a busy machine slows both.
 * NumPy is timed in three layouts and with several sizes of chunks, and the fastest stands for it: `in_place` of `laminate.py`
 * allocates nothing and takes the same sums as the engine. How it fares as one would write it down is printed too.
 */
import { BLOCK, plainDrawing } from "../../engine/uncertainty/drawing.ts";
import { laminateModel } from "../../engine/uncertainty/laminate-model.ts";
import { seededState } from "../../engine/uncertainty/random/generator.ts";
import { sampleUncertainty, sampling } from "../../engine/uncertainty/sample-uncertainty.ts";
import { sourcesOf } from "../../engine/uncertainty/sources.ts";
import { inputsOf, stackOf, uncertaintiesOf } from "./cases.mjs";
import { needNumpy, numpyLaminate } from "./numpy.mjs";
import { median, scatter, shortest } from "./timing.mjs";

const DRAWS = 2 ** 20;
const ROUNDS = 9;

const layers = stackOf(10);
const inputs = inputsOf(layers);
const { curvature } = laminateModel(layers);

/** Nanoseconds per draw of drawing, evaluating and keeping, and of evaluating alone. */
function ownTimes() {
  const draws = DRAWS / 8;
  const all = shortest(3, () => {
    const run = sampling({ model: curvature, inputs, draws, seed: 1 });
    // Up to the last draw: the summary comes with the next call and is timed elsewhere.
    for (let step = run.next(); !step.done && step.value.done < draws; step = run.next());
  });
  const block = curvature.block ?? new Float64Array(BLOCK * inputs.length);
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
  tries: null,
  chunks: [1000, 2000, 4000, 8000, 12_000, 16_000],
  summary: false,
};

/** Whether a way of NumPy's to do it is one that somebody would write down. */
const isPlain = ({ layout }) => layout !== "in_place";

const row = (name, own, other, ratio, wanted) =>
  console.log([name.padEnd(46), own.padEnd(11), other.padEnd(11), ratio.padEnd(18), wanted].join(" | "));
const rate = (ns) => `${(1e3 / ns).toFixed(2)} M/s`;
const ms = (value) => `${(1e3 * value).toFixed(1)} ms`;

/** One row: rates as medians, the ratio as the median of the rounds' own, with the least and the largest of them. */
function rateRow(name, rounds, wanted) {
  const ratios = rounds.map(({ own, other }) => other / own);
  row(
    name,
    rate(median(rounds.map(({ own }) => own))),
    rate(median(rounds.map(({ other }) => other))),
    `${median(ratios).toFixed(2)} (${Math.min(...ratios).toFixed(2)} to ${Math.max(...ratios).toFixed(2)})`,
    wanted,
  );
}

export function compareWithNumpy() {
  const missing = needNumpy();
  // Once for nothing, so that V8 has compiled everything.
  const first = ownTimes();
  if (missing) {
    console.log(missing);
    console.log(`Draws: ${first.nsPerDraw.toFixed(0)} ns each, arithmetic ${first.nsArithmetic.toFixed(0)} ns.`);
    return;
  }
  const numpy = numpyLaminate({ ...given, summary: true });
  // What was fastest in one run need not be in the next: the three fastest ways run in each round, and its fastest counts.
  const best = (found, figure) => found.toSorted((a, b) => a[figure] - b[figure]).slice(0, 3);
  const ways = [
    ...best(numpy.found, "nsPerDraw"),
    ...best(numpy.found, "nsArithmetic"),
    ...best(numpy.found.filter(isPlain), "nsArithmetic"),
  ];
  const tries = [...new Set(ways)].map(({ layout, chunk }) => [layout, chunk]);
  const rounds = Array.from({ length: ROUNDS }, () => {
    const own = ownTimes();
    const { found } = numpyLaminate({ ...given, tries });
    const [total] = best(found, "nsPerDraw");
    const [sums] = best(found, "nsArithmetic");
    const [plain] = best(found.filter(isPlain), "nsArithmetic");
    return { own, total, sums, plain };
  });
  const against = (way, figure) => rounds.map((round) => ({ own: round.own[figure], other: round[way][figure] }));
  const named = (way) => {
    const names = rounds.map((round) => `${round[way].layout}, chunks of ${round[way].chunk}`);
    const count = (name) => names.filter((other) => other === name).length;
    return names.reduce((most, name) => (count(name) > count(most) ? name : most));
  };
  console.log(
    `Processor time, medians of ${ROUNDS} runs in turn. Laminate of 10 layers, 30 normal inputs, one thread; NumPy ${numpy.version}`,
  );
  console.log(
    `    NumPy's fastest, mostly: ${named("total")} with sampling, ${named("sums")} for the arithmetic, ${named("plain")} as one would write it`,
  );
  row("", "engine", "NumPy", "ratio (range)", "wanted");
  rateRow("draws a second, sampling included", against("total", "nsPerDraw"), "1 or more");
  rateRow("draws a second, arithmetic alone", against("sums", "nsArithmetic"), "2 or more");
  rateRow("    against NumPy as one would write it", against("plain", "nsArithmetic"), "");
  row(
    `mean and 95 % point of ${DRAWS} plain draws`,
    ms(shortest(3, () => sample("plain", DRAWS, 1))),
    ms(numpy.seconds),
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
    row(name, ms(found.seconds), ms(numpy.seconds), (found.seconds / numpy.seconds).toFixed(2), "0.2 or less");
    console.log(
      `    standard error of mean ${found.errorOfMean.toExponential(1)} (${numpy.errorOfMean.toExponential(1)}), of 95 % point ${found.errorOfHigh.toExponential(1)} (${numpy.errorOfHigh.toExponential(1)})`,
    );
  }
}

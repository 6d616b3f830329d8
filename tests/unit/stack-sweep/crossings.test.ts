import { expect, test } from "vitest";
import { answerValue } from "#app/lib/stack-sweep/answers.ts";
import { readSweep, sweepSearch } from "#app/lib/stack-sweep/asked.ts";
import { readAxis } from "#app/lib/stack-sweep/axis.ts";
import { limitCrossings } from "#app/lib/stack-sweep/crossings.ts";
import { answerCurve, sweptCurve } from "#app/lib/stack-sweep/curve.ts";
import { sweptFigures } from "#app/lib/stack-sweep/figures.ts";
import { limitChoices, limitsAsked } from "#app/lib/stack-sweep/limits.ts";
import { crossingSentence } from "#app/lib/stack-sweep/sentences.ts";
import { sweptView } from "#app/lib/stack-sweep/view.ts";
import { answer, axisOf, choices, COPPER_STRESS, inputOf, SILICON, site, stack } from "./samples.ts";

const LIMIT = { value: 2e-3, label: "limit 2 mm", of: "" };
const silicon = axisOf(SILICON, "20 um", "775 um");
const valueAt = (key: string, input: string, value: number) =>
  answerValue(answer(key), sweptFigures(inputOf(input).put(stack, value)));

test("a limit is reached where the full model has it, and a sentence says on which side it is more", () => {
  const found = limitCrossings(stack, silicon, answer("warp"), LIMIT.value);
  expect(found.at).toHaveLength(1);
  const at = found.at[0]?.value ?? NaN;
  expect(valueAt("warp", SILICON, at)).toBeCloseTo(2e-3, 12);
  expect(valueAt("warp", SILICON, at * 0.99)).toBeGreaterThan(2e-3);
  expect(found.aboveBefore).toBe(true);
  const [whole] = (at * 1e6).toPrecision(4).split(".");
  expect(crossingSentence(silicon, answer("warp"), LIMIT, found, [])).toMatch(
    new RegExp(`^The warp reaches 2.mm at ${whole ?? ""}[.0-9]*.µm of silicon\\. Below that it is more\\.$`, "u"),
  );
});

test("a warp that comes down to nothing and up again reaches a limit on both sides", () => {
  const axis = axisOf(COPPER_STRESS, "-100 MPa", "400 MPa");
  const found = limitCrossings(stack, axis, answer("warp"), 50e-6);
  expect(found.at).toHaveLength(2);
  for (const { value, jump } of found.at) {
    expect(valueAt("warp", COPPER_STRESS, value)).toBeCloseTo(50e-6, 12);
    expect(jump).toBe(false);
  }
  expect(crossingSentence(axis, answer("warp"), { ...LIMIT, value: 50e-6 }, found, [inputOf(SILICON)])).toMatch(
    /^With silicon thickness 200.µm, the warp reaches 50.µm at Plated copper, device side, stress .* and .*.MPa\.$/u,
  );
});

test("a limit that is not reached says between which values it stays", () => {
  const found = limitCrossings(stack, silicon, answer("stress"), 5e9);
  expect(found.at).toEqual([]);
  expect(crossingSentence(silicon, answer("stress"), { ...LIMIT, value: 5e9 }, found, [])).toMatch(
    /nowhere reaches 5000.MPa from 20.µm to 775.µm: it is .* at least and .* at most\.$/u,
  );
});

test("a curve ends where its answer does, and turns curled at the load that curls", () => {
  const curve = sweptCurve(stack, silicon, answer("bow"), []);
  const { points } = answerCurve(curve, answer("bow"));
  const [curled] = curve.curled;
  expect(curve.curled).toHaveLength(1);
  expect(curled?.from).toBe(silicon.from);
  expect(sweptFigures(inputOf(SILICON).put(stack, (curled?.to ?? 0) * (1 + 1e-9))).load).toBeCloseTo(1, 6);
  expect(points[0]?.x).toBeCloseTo(curled?.to ?? NaN, 12);
  for (const { x, y } of points.filter((_, n) => n % 20 === 0)) expect(y).toBe(valueAt("bow", SILICON, x));
});

test("a film is told by which one it is: another in its place is not taken for it", () => {
  const gone = readAxis({ input: "front gone 1 stress", from: "", to: "" }, choices);
  expect(gone).toEqual({ axis: null, faults: { input: expect.stringContaining("the film was taken out") as string } });
  const copper = choices.filter(({ label }) => label.startsWith("Plated copper") && label.endsWith(": thickness"));
  expect(copper.map(({ label }) => label)).toEqual([
    "Plated copper, device side: thickness",
    "Plated copper, back side: thickness",
  ]);
});

test.each([
  [{ from: "50 um", to: "50 um" }, "to", /empty/],
  [{ from: "700 um", to: "50 um" }, "to", /empty/],
  [{ from: "50 parsecs", to: "" }, "from", /parsecs is not a unit/],
  [{ from: "", to: "3 mm" }, "to", /outside 1 µm to 2 mm/],
])("a range %o is refused at its field", (range, field, words) => {
  const { axis, faults } = readAxis({ input: SILICON, ...range }, choices);
  expect(axis).toBeNull();
  expect(faults[field as "from" | "to"]).toMatch(words);
});

test("what the engine refuses throughout is said, and what it refuses in part is left blank", () => {
  const of = { stack, y: null, answer: answer("warp"), limits: [], site };
  const diameter = (from: string, to: string) => ({ ...axisOf("diameter", from, to) });
  const thick = { ...stack, wafer: { ...stack.wafer, thickness: 1.9e-3 } };
  const partly = sweptView({ ...of, stack: thick, x: diameter("25 mm", "300 mm") });
  expect(partly.fault).toBeNull();
  const wholly = sweptView({
    ...of,
    stack: { ...stack, films: stack.films.map((film) => ({ ...film, poissonsRatio: 2 })) },
    x: silicon,
  });
  expect(wholly.swept).toBeNull();
  expect(wholly.fault).toContain("The engine refuses all of this range");
});

test("tools limit a warp by how it lies, the strictest first; a bow to either side", () => {
  const tools = [
    { id: "a".repeat(36), name: "Coater", edgesUp: 4e-4, edgesDown: 4e-4, largestDiameter: 0.3 },
    { id: "b".repeat(36), name: "Polisher", edgesUp: 2e-4, edgesDown: 3e-4, largestDiameter: 0.3 },
    { id: "c".repeat(36), name: "Small", edgesUp: 1e-5, edgesDown: 1e-5, largestDiameter: 0.2 },
  ];
  const about = { tools, limits: site, diameter: 0.3 };
  const warps = limitChoices(answer("warp"), about);
  expect(warps.map(({ label }) => label.replaceAll("\u00a0", " "))).toEqual([
    "Polisher",
    "Coater",
    "called flat up to 15 µm",
  ]);
  const values = (limit: string, own: string, key: string) =>
    limitsAsked({ limit, own }, answer(key), limitChoices(answer(key), about)).limits.map(({ value }) => value);
  expect(values("", "", "warp")).toEqual([2e-4, 3e-4]);
  expect(values("", "", "bow")).toEqual([-2e-4, 3e-4]);
  expect(values("a".repeat(36), "", "warp")).toEqual([4e-4]);
  expect(values("none", "", "warp")).toEqual([]);
  expect(values("none", "2 mm", "bow")).toEqual([-2e-3, 2e-3]);
  expect(values("", "", "stress")).toEqual([]);
  expect(values("", "", "load")).toEqual([site.curlMargin.value]);
  const asked = { limit: "d".repeat(36), own: "" };
  expect(limitsAsked(asked, answer("warp"), warps).faults.limit).toContain("any more");
  expect(limitsAsked({ limit: "", own: "2 MPa" }, answer("warp"), warps).faults.own).toContain("MPa");
});

test("an address says all of it and nothing more", () => {
  const address = `?${new URLSearchParams({ x: "silicon", "x-from": "50 um", y: COPPER_STRESS, answer: "bow", at: "150 C" }).toString()}`;
  expect(sweepSearch(readSweep(new URLSearchParams(address)))).toBe(address);
  expect(sweepSearch(readSweep(new URLSearchParams()))).toBe("");
});

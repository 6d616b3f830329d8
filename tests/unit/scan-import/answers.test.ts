import { describe, expect, it } from "vitest";
import { answersTo, keptProfile, withRole, withUnit } from "#app/lib/scan-import/answers.ts";
import type { Told } from "#app/lib/scan-import/told.ts";
import { importProfileSchema, type ImportProfile } from "#app/schemas/import-profile.ts";
import { toldOf } from "./told.ts";

const rows = (row: (n: number) => string, count = 12) => Array.from({ length: count }, (_, n) => row(n)).join("\n");
const readingOf = ({ layout }: Told) => {
  if (!layout) throw new Error("the form of the file is not told");
  return layout.reading;
};

/** Answers the first open question by the answer with these words, and reads again. */
async function answered(text: string, words: string | RegExp, profile: ImportProfile = {}) {
  const reading = readingOf(await toldOf(text, profile));
  const [open] = reading.ambiguities;
  const answers = open ? answersTo(open, reading, profile) : [];
  const chosen = answers.find(({ label }) => (typeof words === "string" ? label === words : words.test(label)));
  if (!chosen) throw new Error(`none of ${answers.map(({ label }) => label).join(", ")}`);
  expect(importProfileSchema.safeParse(chosen.profile).success).toBe(true);
  return { profile: chosen.profile, told: await toldOf(text, chosen.profile) };
}

describe("'1,100' is 1.1 or 1100", () => {
  const text = `x (µm);z (µm)\n${rows((n) => `${n + 1},${100 + n};${3 + n},50${n % 10}`)}`;

  it("is answered with one press, either way", async () => {
    const decimal = await answered(text, "1.100, a decimal comma");
    expect(decimal.told.profiles[0]?.trace[0]?.x).toBeCloseTo(1.1e-6, 12);
    const grouped = await answered(text, "1100, thousands grouped by a comma");
    expect(grouped.told.profiles[0]?.trace[0]?.x).toBeCloseTo(1.1e-3, 9);
  });

  it("is asked for thousands when only the mark is said", async () => {
    const { told } = await answered(text, "thousands are grouped", { decimalMark: "point" });
    expect(told.outcome).toBe("read");
  });
});

it("marks of both kinds are answered by the mark", async () => {
  const text = `x (mm);z (µm)\n${rows((n) => (n === 3 ? "3,5;1,5" : `${n}.5;${n}.25`))}`;
  const { told } = await answered(text, "decimal point");
  expect(told).toMatchObject({ outcome: "read", faults: [{ count: 1 }] });
});

it("units are answered column by column, for every column of that role", async () => {
  const text = `x,z\n${rows((n) => `${n}.5,${n * n}.25`)}`;
  const first = await answered(text, "mm");
  expect(first.told.outcome).toBe("question");
  const second = await answered(text, "µm", first.profile);
  expect(second.profile.units).toEqual({ position: "mm", height: "µm" });
  expect(second.told.profiles[0]?.trace.at(-1)).toMatchObject({
    x: 0.0115,
    z: expect.closeTo(121.25e-6, 12) as number,
  });
});

it("columns without heads are told by their roles, one after the other", async () => {
  const text = rows((n) => `${n % 3}.5;${n % 2}.25`);
  const asked = await toldOf(text);
  expect(readingOf(asked).ambiguities).toMatchObject([{ what: "columns" }, ...readingOf(asked).ambiguities.slice(1)]);
  const one = withRole({}, readingOf(asked).columns, 1, "position");
  const both = withRole(one, readingOf(await toldOf(text, one)).columns, 0, "height");
  const units = withUnit(withUnit(both, "position", 1, "mm"), "height", 0, "nm");
  expect((await toldOf(text, units)).profiles).toMatchObject([{ points: 12 }]);
  expect(withUnit(withUnit(units, "position", 1, null), "height", 0, null).units).toBeUndefined();
});

it("what is kept for an instrument reads its next file without a question", async () => {
  const text = `x,z\n${rows((n) => `${n}.5,${n * n}.25`)}`;
  const { profile } = await answered(text, "µm", (await answered(text, "mm")).profile);
  const kept = keptProfile(readingOf(await toldOf(text, profile)), profile);
  expect(importProfileSchema.parse(kept)).toEqual(kept);
  expect((await toldOf(text.replaceAll(".25", ".75"), kept)).outcome).toBe("read");
});

it("a profile that contradicts the file is refused with the place", async () => {
  const text = `x (mm),z (µm)\n${rows((n) => `${n}.5,${n * n}.25`)}`;
  const told = await toldOf(text, withUnit({}, "height", 1, "nm"));
  expect(told.outcome).toBe("refused");
  expect(told.sentence).toMatch(/^scan\.csv, row 1: .*in µm, but nm is chosen/);
});

it("content that is refused still tells its form, so that it can be put right", async () => {
  const told = await toldOf(`x (m),z (µm)\n${rows((n) => `${n * 9}.5,${n}.25`)}`);
  expect(told).toMatchObject({ outcome: "refused", layout: { reading: { kind: "profiles" } } });
});

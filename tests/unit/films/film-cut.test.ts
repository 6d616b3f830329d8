import { describe, expect, it } from "vitest";
import { directionWords, filmCutText, filmCutWords, readFilmCut, WHOLE, type FilmCutText } from "#app/lib/film-cut.ts";
import { stackSchema } from "#app/schemas/stack.ts";
import { stepSchema } from "#app/schemas/flow.ts";

const plain = (text: string | null) => text?.replaceAll("\u00A0", " ") ?? null;
const LINES = { width: 10e-6, direction: Math.PI / 2 };

describe("a cut in words", () => {
  it.each([
    [{ coverage: 1 }, null],
    [{ coverage: 0.35 }, "35 %"],
    [{ coverage: 0.35, lines: { width: 10e-6, direction: 0 } }, "35 % in lines 10 µm wide, along the notch axis"],
    [{ coverage: 1, lines: LINES }, "100 % in lines 10 µm wide, across the notch axis"],
  ])("%j", (film, words) => expect(plain(filmCutWords(film))).toBe(words));

  it("takes an axis for the same from either end", () => {
    expect(directionWords(Math.PI)).toBe("along the notch axis");
    expect(directionWords(-Math.PI / 2)).toBe("across the notch axis");
    expect(plain(directionWords(Math.PI / 6))).toBe("at 30° to the notch axis");
  });
});

describe("a cut as its fields", () => {
  const read = (text: FilmCutText) => {
    const faults: string[] = [];
    return { cut: readFilmCut(text, (part) => faults.push(part)), faults };
  };

  it.each([{ coverage: 1 }, { coverage: 0.123 }, { coverage: 0.4, lines: LINES }])(
    "%j comes back as it was",
    (film) => {
      const { cut, faults } = read(filmCutText(film));
      expect(faults).toEqual([]);
      expect(cut?.coverage).toBeCloseTo(film.coverage, 12);
      expect(cut?.lines?.width ?? null).toBe(film.lines?.width ?? null);
      expect(cut?.lines?.direction ?? 0).toBeCloseTo(film.lines?.direction ?? 0, 9);
    },
  );

  it("asks only for what the choice needs", () => {
    expect(read(WHOLE)).toEqual({ cut: { coverage: 1, lines: null }, faults: [] });
    expect(read({ ...WHOLE, cut: "alike" }).faults).toEqual(["coverage"]);
    expect(read({ ...WHOLE, cut: "lines" }).faults).toEqual(["coverage", "lineWidth", "lineDirection"]);
  });
});

describe("a cut as it is posted", () => {
  const ID = "11111111-1111-4111-8111-111111111111";
  const typed = (cut: Record<string, string>) => ({ side: "front", film: ID, thickness: { value: "5 um" }, ...cut });
  const ofStack = (cut: Record<string, string>) =>
    stackSchema.safeParse({
      name: "One",
      program: ID,
      silicon: ID,
      siliconThickness: { value: "0.3 mm" },
      layers: [typed(cut)],
    });
  const ofStep = (cut: Record<string, string>) =>
    stepSchema.safeParse({
      title: "Plate",
      kind: "plate",
      peakTemperature: "25 °C",
      planned: "bare",
      films: [{ change: "adds", ...typed(cut) }],
    });

  it.each([
    [{ cut: "whole" }, { coverage: 1, lines: null }],
    [
      { cut: "alike", coverage: "38 %" },
      { coverage: 0.38, lines: null },
    ],
    [{ coverage: "38 %" }, { coverage: 0.38, lines: null }],
    [
      { cut: "lines", coverage: "0.5", lineWidth: "10 um", lineDirection: "90 deg" },
      { coverage: 0.5, lines: { width: 1e-5, direction: Math.PI / 2 } },
    ],
  ])("%j is taken by stack and step alike", (cut, stored) => {
    expect(ofStack(cut).data?.layers[0]).toMatchObject(stored);
    const [film] = ofStep(cut).data?.films ?? [];
    expect({ coverage: film?.coverage ?? 1, lines: film?.lines ?? null }).toEqual(stored);
  });

  it.each([
    [{ cut: "alike" }, ["coverage"], "Blank is missing"],
    [{ cut: "lines", coverage: "50 %" }, ["lineWidth", "lineDirection"], "Blank is missing"],
    [{ cut: "whole", coverage: "38 %" }, ["coverage"], "A whole film covers 100 %"],
    [{ cut: "alike", coverage: "38 %", lineWidth: "10 um" }, ["lineWidth"], "Only lines have it"],
    [
      { cut: "lines", coverage: "50 %", lineWidth: "-3 um", lineDirection: "90" },
      ["lineWidth", "lineDirection"],
      "outside",
    ],
    [{ cut: "stripes", coverage: "50 %" }, ["cut"], "Choose how the film is cut"],
  ])("%j is refused at the field by stack and step alike", (cut, fields, says) => {
    for (const read of [ofStack(cut), ofStep(cut)]) {
      expect(read.error?.issues.map(({ path }) => path.at(-1))).toEqual(fields);
      expect(read.error?.issues[0]?.message).toContain(says);
    }
  });
});

import { describe, expect, it } from "vitest";
import { flowFigures } from "#app/lib/flow-figures.ts";
import { planColumns } from "#app/lib/flow-plan.ts";
import { stepRows, type ShownStep } from "#app/lib/flow-rows.ts";
import { filmThicknessText, siliconText } from "#app/lib/flow-thickness.ts";
import { STEP_KINDS } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";

const um = (micrometres: number) => micrometres / 1e6;
const stated = (value: number, tolerance: number | null = null, source: Measured["source"] = "supplier"): Measured => ({
  value,
  tolerance,
  source,
});
const incoming = stated(um(725), um(15));

const step = (overrides: Partial<ShownStep> = {}): ShownStep => ({
  id: "id",
  kind: "measure",
  title: "Measure",
  peakTemperature: 298.15,
  holdTime: null,
  equipment: { name: "Tool" },
  exposures: [],
  planned: "bare",
  siliconAfter: null,
  trimWidth: null,
  trimDepth: null,
  carrier: null,
  bondingMaterial: null,
  bondThickness: null,
  films: [],
  ...overrides,
});
const bond = step({
  kind: "bond",
  planned: "carrier",
  carrier: { name: "Glass carrier" },
  bondingMaterial: { name: "Adhesive" },
  bondThickness: stated(um(50)),
});

describe("rows of the step table", () => {
  it("numbers the steps and carries silicon on from one to the next", () => {
    const rows = stepRows([step(), step({ siliconAfter: stated(um(110), um(3)) }), step()], incoming);
    expect(rows.map(({ number, silicon }) => [number, silicon.text, silicon.changed])).toEqual([
      [1, "725\u00a0±\u00a015", false],
      [2, "110\u00a0±\u00a03", true],
      [3, "110\u00a0±\u00a03", false],
    ]);
  });

  it("says what is added, removed and trimmed, with side, thickness and coverage", () => {
    const [row] = stepRows(
      [
        step({
          trimWidth: stated(0.7e-3),
          trimDepth: stated(um(150)),
          films: [
            { change: "removes", side: "back", film: { name: "Seed" }, thickness: null, coverage: 1 },
            { change: "adds", side: "front", film: { name: "Copper" }, thickness: stated(um(0.3)), coverage: 0.35 },
          ],
        }),
      ],
      incoming,
    );
    expect(row?.changes).toEqual([
      { word: "trims", what: "edge, 0.7\u00a0mm wide, 150\u00a0µm deep", side: null },
      { word: "removes", what: "Seed", side: "back side" },
      { word: "adds", what: "Copper, 0.3\u00a0µm, 35\u00a0%", side: "device side" },
    ]);
  });

  it("names the carrier from the bond to the debond, the bond itself in full", () => {
    const debond = step({ kind: "debond", planned: "film frame" });
    const rows = stepRows([step(), bond, step({ planned: "carrier" }), debond, step()], incoming);
    expect(rows.map((row) => row.bond)).toEqual([
      null,
      "Glass carrier, Adhesive, 50\u00a0µm",
      "Glass carrier",
      null,
      null,
    ]);
  });

  it("names both carriers of a transfer, and what its debond lets go", () => {
    const second = {
      ...bond,
      carrier: { name: "Silicon carrier" },
      handling: { bondFace: "back", debondFace: null },
    } as const;
    const held = step({ planned: "carrier" });
    const letGo = (debondFace: "front" | "back") =>
      step({ kind: "debond", planned: "carrier", handling: { bondFace: null, debondFace } });
    const rows = stepRows([bond, second, held, letGo("front"), letGo("front"), letGo("back")], incoming);
    expect(rows.map((row) => row.bond)).toEqual([
      "Glass carrier, Adhesive, 50\u00a0µm",
      "Silicon carrier, Adhesive, 50\u00a0µm, on the back side",
      "Glass carrier and Silicon carrier",
      "Silicon carrier",
      "Silicon carrier",
      null,
    ]);
    expect(rows.slice(3).map(({ changes }) => changes)).toEqual([
      [{ word: "lets go", what: "Glass carrier", side: "device side" }],
      [],
      [{ word: "lets go", what: "Silicon carrier", side: "back side" }],
    ]);
    expect(planColumns([bond, second, letGo("front")], incoming).map(({ planned }) => planned)).toEqual([
      "Glass carrier",
      "both carriers",
      "Silicon carrier",
    ]);
  });

  it("gives temperature and time without a false digit", () => {
    const [row] = stepRows([step({ peakTemperature: 503.15, holdTime: 7200 })], incoming);
    expect(row).toMatchObject({ peak: "230", minutes: "2\u00a0h" });
    expect(stepRows([step()], incoming)[0]?.minutes).toBeNull();
  });

  it("marks a step with an assumed number", () => {
    expect(stepRows([step({ siliconAfter: stated(um(110), null, "assumed") })], incoming)[0]?.assumed).toBe(true);
    expect(stepRows([bond], incoming)[0]?.assumed).toBe(false);
  });
});

describe("columns of the drawn plan", () => {
  it("draws a carrier by its name and nothing where it is bare", () => {
    const columns = planColumns(
      [step(), bond, step({ kind: "grind", planned: "carrier", siliconAfter: stated(um(50)) })],
      incoming,
    );
    expect(columns.map(({ planned }) => planned)).toEqual([null, "Glass carrier", "Glass carrier"]);
    expect(columns.map(({ silicon }) => silicon.text)).toEqual(["725", "725", "50"]);
  });

  it("has a short name of at most twelve characters for every kind", () => {
    const columns = planColumns(
      STEP_KINDS.map((kind) => step({ kind })),
      incoming,
    );
    for (const { shortName } of columns) expect(shortName.length).toBeLessThanOrEqual(12);
  });
});

describe("thicknesses as the trade says them", () => {
  it.each([
    { value: um(0.3), text: "0.3\u00a0µm" },
    { value: 20e-9, text: "20\u00a0nm" },
    { value: um(5), text: "5\u00a0µm" },
    { value: um(130), text: "130\u00a0µm" },
  ])("$value m is $text", ({ value, text }) => {
    expect(filmThicknessText(value)).toBe(text);
  });

  it("shows a half-width as it was stated, and none where none was", () => {
    expect(siliconText(stated(um(100), um(3)))).toBe("100\u00a0±\u00a03");
    expect(siliconText(stated(um(50)))).toBe("50");
  });
});

describe("figures of a flow", () => {
  it("have their units, and say so where there are no steps", () => {
    const silicon = { name: "Silicon (001), 200 mm", diameter: 0.2 };
    const figures = flowFigures({
      silicon,
      incoming,
      incomingBow: null,
      thinnest: stated(um(100), um(3)),
      hottest: 518.15,
      rows: [1, 2],
      legs: [],
    });
    expect(figures.map(({ value }) => value)).toEqual([
      "Silicon (001), 200 mm",
      "725\u00a0±\u00a015\u00a0µm",
      "100\u00a0±\u00a03\u00a0µm",
      "245\u00a0°C",
      "2",
    ]);
    const empty = flowFigures({
      silicon,
      incoming,
      incomingBow: null,
      thinnest: null,
      hottest: null,
      rows: [],
      legs: [],
    });
    expect(empty.map(({ value }) => value).slice(2, 4)).toEqual(["no steps yet", "no steps yet"]);
  });

  it("say the bow that the wafer comes in with, once where both directions are alike", () => {
    const silicon = { name: "Silicon (001), 200 mm", diameter: 0.2 };
    const comesIn = (along: number, across: number) =>
      flowFigures({
        ...{ silicon, incoming, thinnest: null, hottest: null, rows: [], legs: [] },
        incomingBow: { along: stated(um(along)), across: stated(um(across)) },
      })[1]?.value;
    expect(comesIn(-90, -80)).toBe("725\u00a0±\u00a015\u00a0µm, bow −90\u00a0µm and −80\u00a0µm");
    expect(comesIn(-90, -90)).toBe("725\u00a0±\u00a015\u00a0µm, bow −90\u00a0µm");
  });
});

import { describe, expect, it } from "vitest";
import { figureOfHead } from "#app/lib/scan-reading/summary.ts";
import { questionsOf, refusalOf, tableOf } from "./read.ts";

const lines = (count: number, line: (n: number) => string) =>
  Array.from({ length: count }, (_, n) => line(n)).join("\n");

describe("a summary, one row a wafer", () => {
  const head = "Lot;Slot;WaferID;Thk_ctr;TTV;Bow_BF_EE3;Warp;Sori";
  const wafers = lines(25, (n) => `L7;${n + 1};L7-${n + 1};77${n % 10},5;1,25;-${n + 30},5;${n + 60},1;${n + 61},0`);
  const text = `${head}\n;;;µm;µm;µm;µm;µm\n${wafers}\nMean;;;775,1;1,2;-40;70;71\n3 sigma;;;1;1;1;1;1\n`;
  const { reading, content } = tableOf("summary", text);

  it("is told from profiles, with its units", () => {
    expect(reading).toMatchObject({ kind: "summary", decimalMark: "comma", headerRow: 1, unitsRow: 2, firstRow: 3 });
    expect(
      content.figures.map(({ quantity, reference, statistic, edgeExclusion }) => [
        quantity,
        reference,
        statistic,
        edgeExclusion,
      ]),
    ).toEqual([
      ["thickness", null, "centre", null],
      ["thickness variation", null, null, null],
      ["bow", "best fit", null, 0.003],
      ["warp", null, null, null],
      ["sori", null, null, null],
    ]);
  });

  it("gives every wafer by its slot, SI, and leaves statistics below it out", () => {
    expect(content.wafers).toHaveLength(25);
    expect(content.footerLines).toBe(2);
    expect(content.wafers[6]).toMatchObject({ row: 9, lot: "L7", slot: 7, wafer: "L7-7" });
    [776.5e-6, 1.25e-6, -36.5e-6, 66.1e-6, 67e-6].forEach((value, n) =>
      expect(content.wafers[6]?.values[n]).toBeCloseTo(value, 12),
    );
  });

  it("says that nobody has said how it was measured, and keeps what was said", () => {
    expect(reading.ambiguities).toMatchObject([{ what: "how measured", blocks: false }]);
    const measured = { sideUp: "device", support: "three points", gravity: "compensated" } as const;
    const said = tableOf("summary", text, { measured });
    expect(said.reading.ambiguities).toEqual([]);
    expect(said.content.measured).toEqual(measured);
  });

  it("asks for units that it does not name", () => {
    const bare = `${head}\n${wafers}`;
    expect(questionsOf(bare).map(({ what, column }) => [what, column])).toEqual(
      [3, 4, 5, 6, 7].map((column) => ["unit", column]),
    );
    const units = { thickness: "µm", "thickness variation": "µm", bow: "µm", warp: "µm", sori: "µm" } as const;
    expect(tableOf("summary", bare, { units }).content.wafers).toHaveLength(25);
  });

  it("groups faults: no slot, a wafer twice, a figure that is none", () => {
    const odd = "Slot,Bow (um),Warp (um)\n1,-30.5,60.1\n1,-30.5,60.1\nS03,n/a,61.5\nnotch,-31.5,62.5\n4,bad one,63.5\n";
    const found = tableOf("summary", odd).content;
    expect(found.wafers.map(({ slot, values }) => [slot, values[0]])).toEqual([
      [1, -30.5e-6],
      [1, -30.5e-6],
      [3, null],
      [4, null],
    ]);
    expect(found.faults.map(({ cause, places }) => [cause, places.map(({ row }) => row)])).toEqual([
      ["not a slot", [5]],
      ["not a number", [6]],
      ["wafer listed twice", [3]],
      ["neither slot nor wafer", [5]],
    ]);
  });

  it("needs a slot or a name, and no formula in it", () => {
    expect(refusalOf("Bow (um),Warp (um)\n-30.5,60.1\n-31.5,61.2\n")).toMatch(/neither a slot nor a wafer’s name/);
    expect(refusalOf("Wafer,Bow (um),Warp (um)\nW1,-30.5,60.1\n=cmd|'a'!A0,-31.5,61.2\n")).toMatch(
      /row 3, column 1 holds “=cmd.*a formula/,
    );
  });

  it.each([
    ["Bow-3P (um)", { reference: "three-point", edgeExclusion: null, statistic: null }],
    ["Bow_3pt_EE3", { reference: "three-point", edgeExclusion: 0.003, statistic: null }],
    ["Warp bf 5mm [µm]", { reference: "best fit", edgeExclusion: 0.005, statistic: null }],
    ["Warp Best Fit, EE 2.5 mm", { reference: "best fit", edgeExclusion: 0.0025, statistic: null }],
    ["Thk_avg", { reference: null, edgeExclusion: null, statistic: "mean" }],
    ["Thickness max", { reference: null, edgeExclusion: null, statistic: "greatest" }],
  ])("'%s' says what it says", (heading, says) => expect(figureOfHead(heading)).toEqual(says));
});

describe("a thickness map", () => {
  const cartesian = `Site,X (mm),Y (mm),Thickness (um)\n${lines(49, (n) => `${n + 1},${(n % 7) * 20 - 60},${Math.floor(n / 7) * 20 - 60},${50 + n / 10}`)}\n`;

  it("by x and y", () => {
    const { content, reading } = tableOf("thickness map", cartesian, { underneath: "tape" });
    expect(reading.ambiguities).toEqual([]);
    expect(content).toMatchObject({ polar: false, underneath: "tape", faults: [] });
    expect(content.sites).toHaveLength(49);
    expect(content.sites[8]).toMatchObject({ row: 10, x: -0.04, y: -0.04 });
    expect(content.sites[8]?.thickness).toBeCloseTo(50.8e-6, 15);
  });

  it("by radius and angle", () => {
    const { content } = tableOf(
      "thickness map",
      "R (mm);Theta (deg);Thk (µm)\n0;0;50,5\n50;0;50,6\n50;90;50,7\n50;180;50,8\n50;270;50,9\n",
    );
    expect(content.polar).toBe(true);
    [
      [0, 0],
      [0.05, 0],
      [0, 0.05],
      [-0.05, 0],
      [0, -0.05],
    ].forEach(([x = 0, y = 0], n) => {
      expect(content.sites[n]?.x).toBeCloseTo(x, 12);
      expect(content.sites[n]?.y).toBeCloseTo(y, 12);
    });
  });

  it("needs five whole sites", () => {
    expect(refusalOf(cartesian.split("\n").slice(0, 5).join("\n"))).toMatch(
      /has 4 whole sites; a map needs at least 5/,
    );
  });
});

describe("stress that a tool has reduced", () => {
  const text = `Wafer,R1 (m),R2 (m),Film thickness (A),Substrate thickness (um),Modulus (1E11 Pa),Stress (1E9 dyn/cm2)
M-01,inf,-30.5,10000,725,1.805,1.5
M-02,250.0,-41.25,10000,725,1.805,-2.25
M-03,0,-41.25,10000,725,1.805,bad
`;
  const { content } = tableOf("reduced stress", text);

  it("is kept as given, with its radii as curvatures: 1E9 dyn/cm² are 100 MPa", () => {
    expect(content.wafers).toEqual([
      {
        row: 2,
        lot: null,
        slot: null,
        wafer: "M-01",
        stress: 150e6,
        modulus: 180.5e9,
        filmThickness: 1e-6,
        substrateThickness: 725e-6,
        curvatureBefore: 0,
        curvatureAfter: -1 / 30.5,
      },
      {
        row: 3,
        lot: null,
        slot: null,
        wafer: "M-02",
        stress: -225e6,
        modulus: 180.5e9,
        filmThickness: 1e-6,
        substrateThickness: 725e-6,
        curvatureBefore: 1 / 250,
        curvatureAfter: -1 / 41.25,
      },
    ]);
    expect(content.faults).toEqual([
      { cause: "radius of nothing", count: 1, places: [{ row: 4, column: 1, text: "0" }] },
    ]);
  });

  it.each([
    ["MPa", 150e6],
    ["GPa", 150e9],
    ["1E9 dyn/cm²", 15e9],
    ["E9 dyn/cm^2", 15e9],
    ["1E10 dyne/cm2", 150e9],
    ["dyn/cm2", 15],
  ])("stress in %s", (unit, pascals) => {
    const [wafer] = tableOf(
      "reduced stress",
      `Wafer,Film thickness (nm),Stress (${unit})\nM-01,500.5,150\nM-02,500.5,151\n`,
    ).content.wafers;
    expect(wafer?.stress).toBeCloseTo(pascals, 3);
  });
});

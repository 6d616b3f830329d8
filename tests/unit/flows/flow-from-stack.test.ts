import { describe, expect, it } from "vitest";
import {
  needsCarrier,
  proposeSteps,
  type ChosenBond,
  type StackFilm,
  type StackStart,
} from "#app/lib/flow-from-stack.ts";
import { proposedRows } from "#app/lib/flow-proposed-rows.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { StepValues } from "#app/schemas/flow.ts";

const um = (micrometres: number) => micrometres / 1e6;
const stated = (value: number, tolerance: number | null = null): Measured => ({
  value,
  tolerance,
  source: "measured here",
});

const TOOLS = [
  "Cassette or box store 200 mm",
  "Polymer cure oven",
  "Single-wafer wet or plating",
  "Sputter, electrostatic or clamp chuck",
  "Plasma deposition, electrostatic chuck",
  "Reflow oven, belt or plate",
  "Edge trimmer",
  "Tape laminator",
  "Grinder and polisher",
  "Frame mounter",
  "Wafer bonder",
  "Debonder",
  "Frame cleaner",
  "Dicer",
  "Frame store",
].map((name) => ({ id: name.toLowerCase(), name }));

const film = (kind: StackFilm["kind"], thickness: number, more: Partial<StackFilm> = {}): StackFilm => ({
  side: "front",
  id: kind,
  name: `Some ${kind}`,
  kind,
  thickness: stated(um(thickness)),
  stress: null,
  coverage: 1,
  ...more,
});

const BOND: ChosenBond = {
  carrier: { id: "glass", name: "Glass carrier" },
  material: {
    id: "adhesive",
    name: "Adhesive",
    bondTemperature: 453.15,
    releaseTemperature: 298.15,
    leastThickness: um(20),
    mostThickness: um(60),
  },
};

const start = (target: number, more: Partial<StackStart> = {}): StackStart => ({
  diameter: 0.2,
  incoming: stated(um(725), um(15)),
  target: stated(um(target), um(3)),
  films: [],
  tools: TOOLS,
  bond: null,
  ...more,
});

const kinds = (steps: StepValues[]) => steps.map(({ kind }) => kind);
const celsius = ({ peakTemperature }: StepValues) => Math.round(peakTemperature - 273.15);
const only = (of: StackFilm) => {
  const [, step] = proposeSteps(start(400, { films: [of] }));
  if (!step) throw new Error("a film has its step");
  return step;
};

describe("how a film comes onto the wafer", () => {
  it.each([
    { of: film("polymer", 5), kind: "cure", peak: 230, tool: "polymer cure oven", exposures: ["nitrogen"] },
    { of: film("metal", 5), kind: "plate", peak: 25, tool: "single-wafer wet or plating", exposures: ["acid"] },
    {
      of: film("metal", 1),
      kind: "deposit",
      peak: 100,
      tool: "sputter, electrostatic or clamp chuck",
      exposures: ["vacuum", "plasma"],
    },
    {
      of: film("inorganic", 0.8),
      kind: "deposit",
      peak: 180,
      tool: "plasma deposition, electrostatic chuck",
      exposures: ["vacuum", "plasma"],
    },
    {
      of: film("solder", 100),
      kind: "reflow",
      peak: 245,
      tool: "reflow oven, belt or plate",
      exposures: ["flux", "nitrogen"],
    },
  ])("$of.kind of $of.thickness.value m: $kind at $peak °C", ({ of, kind, peak, tool, exposures }) => {
    const step = only(of);
    expect(step).toMatchObject({ kind, equipment: tool, exposures, planned: "bare" });
    expect(celsius(step)).toBe(peak);
    expect(step.films).toEqual([
      { change: "adds", side: "front", film: of.id, thickness: of.thickness, stress: null, coverage: 1, lines: null },
    ]);
  });

  it("keeps what the stack says of the film, and says it in the title", () => {
    const step = only(film("metal", 5, { coverage: 0.35, stress: stated(200e6) }));
    expect(step.title).toBe("Plate Some metal, 5 µm, 35 %");
    expect(step.films[0]).toMatchObject({ coverage: 0.35, stress: { value: 200e6 } });
    const lines = { width: 10e-6, direction: 0 };
    const cut = only(film("metal", 5, { coverage: 0.35, lines }));
    expect(cut.title).toBe("Plate Some metal, 5 µm, 35 % in lines 10 µm wide, along the notch axis");
    expect(cut.films[0]).toMatchObject({ coverage: 0.35, lines });
  });

  it("leaves the tool open where the site has none of that name", () => {
    const [, step] = proposeSteps(start(400, { films: [film("polymer", 5)], tools: [] }));
    expect(step?.equipment).toBeNull();
  });
});

describe("how the wafer is thinned", () => {
  it("on tape down to 50 µm: laminate, grind to 10 µm more, relieve, mount, dice, store", () => {
    const steps = proposeSteps(start(100));
    expect(kinds(steps)).toEqual([
      "receive",
      "edge trim",
      "laminate tape",
      "grind",
      "stress relief",
      "mount on frame",
      "dice",
      "store",
    ]);
    expect(steps[3]?.siliconAfter).toMatchObject({
      value: um(110),
      source: "assumed",
      note: "proposed by Planeward, check it",
    });
    expect(steps[4]?.siliconAfter).toEqual(stated(um(100), um(3)));
    expect(steps.map(({ planned }) => planned).slice(2)).toEqual([
      "grinding tape",
      "grinding tape",
      "grinding tape",
      "film frame",
      "film frame",
      "film frame",
    ]);
    expect(needsCarrier(start(50))).toBe(false);
  });

  it("trims the edge only below 150 µm, 50 µm deeper than the target", () => {
    expect(kinds(proposeSteps(start(150)))).not.toContain("edge trim");
    const trim = proposeSteps(start(149)).find(({ kind }) => kind === "edge trim");
    expect(trim?.trimDepth?.source).toBe("assumed");
    expect(trim?.trimDepth?.value).toBeCloseTo(um(199), 12);
  });

  it("on the carrier that was chosen below 50 µm, or when back-side films follow", () => {
    expect(needsCarrier(start(49))).toBe(true);
    const films = [film("inorganic", 0.5, { side: "back" }), film("metal", 1.4, { side: "back" })];
    expect(needsCarrier(start(100, { films }))).toBe(true);
    const steps = proposeSteps(start(100, { films, bond: BOND }));
    expect(kinds(steps)).toEqual([
      "receive",
      "edge trim",
      "bond",
      "grind",
      "stress relief",
      "back-side film",
      "back-side film",
      "mount on frame",
      "debond",
      "clean",
      "dice",
      "store",
    ]);
    expect(steps[2]).toMatchObject({
      carrier: "glass",
      bondingMaterial: "adhesive",
      peakTemperature: 453.15,
      planned: "carrier",
    });
    expect(steps[2]?.bondThickness).toMatchObject({ value: um(40), source: "assumed" });
    expect(steps[7]?.planned).toBe("carrier");
    expect(steps[8]).toMatchObject({ planned: "film frame", peakTemperature: 298.15 });
  });

  it("refuses to propose a carrier that nobody chose", () => {
    expect(() => proposeSteps(start(20))).toThrow("none was chosen");
  });

  it("does not grind where the target is within 10 µm, and thins nothing that stays as thick as it comes", () => {
    expect(kinds(proposeSteps(start(720)))).toEqual([
      "receive",
      "laminate tape",
      "stress relief",
      "mount on frame",
      "dice",
      "store",
    ]);
    const films = [film("metal", 1, { side: "back" })];
    expect(needsCarrier(start(725, { films }))).toBe(false);
    expect(kinds(proposeSteps(start(725, { films })))).toEqual([
      "receive",
      "back-side film",
      "mount on frame",
      "dice",
      "store",
    ]);
  });

  it("marks every number of its own as assumed", () => {
    const steps = proposeSteps(
      start(40, { films: [film("metal", 5), film("polymer", 2, { side: "back" })], bond: BOND }),
    );
    const own = steps.flatMap(({ kind, siliconAfter, trimWidth, trimDepth, bondThickness, groundFaceForce }) => [
      kind === "grind" ? siliconAfter : null,
      trimWidth,
      trimDepth,
      bondThickness,
      groundFaceForce,
    ]);
    const given = own.filter((measured) => measured !== null);
    expect(given).toHaveLength(6);
    expect(new Set(given.map(({ source, note }) => `${source}: ${note}`))).toEqual(
      new Set(["assumed: proposed by Planeward, check it"]),
    );
  });
});

describe("the proposal as rows", () => {
  it("names tools, films and what is chosen", () => {
    const rows = proposedRows(start(40, { films: [film("metal", 5)], bond: BOND }));
    const bond = rows.find(({ kind }) => kind === "bond");
    expect(bond).toMatchObject({ peak: "180", bond: "Glass carrier, Adhesive, 40\u00a0µm", tool: "Wafer bonder" });
    expect(rows[1]?.changes[0]?.what).toBe("Some metal, 5\u00a0µm");
  });

  it("says what is still to be chosen", () => {
    const rows = proposedRows(start(40));
    expect(rows.find(({ kind }) => kind === "bond")).toMatchObject({ peak: "as chosen" });
    expect(rows.find(({ kind }) => kind === "debond")).toMatchObject({ peak: "as chosen" });
  });
});

/*
 * The handling rules at a wafer that is bonded by its back side, or between two carriers.
 *
 *   h    thickness of silicon, adhesive and carrier    m
 *   T    peak temperature, °C in the tests             K
 */
import { describe, expect, it } from "vitest";
import type { BondingMaterialInput, CarrierInput, StepInput } from "#app/engine/flow/model.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { findBonds } from "#app/engine/finder/find-bonds.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import {
  addition,
  adhesive,
  bondStep,
  carrier,
  celsius,
  debondStep,
  exact,
  findings,
  flow,
  frameStep,
  grindStep,
  outcomes,
  step,
  STANDS_ALL,
  tool,
  um,
} from "./flow-samples.ts";

const A = carrier({ id: "a", name: "Carrier A" });
const B = carrier({ id: "b", name: "Carrier B" });
const glueA = (overrides: Partial<BondingMaterialInput> = {}) =>
  adhesive({ id: "glue a", name: "Adhesive A", ...overrides });
const glueB = (overrides: Partial<BondingMaterialInput> = {}) =>
  adhesive({ id: "glue b", name: "Adhesive B", temperatureLimit: exact(celsius(200)), ...overrides });

const on = (face: Side, material: BondingMaterialInput, plate: CarrierInput, thickness = 40): StepInput =>
  bondStep({ bond: { carrier: plate, material, thickness: exact(um(thickness)), face } });
const front = (material = glueA(), plate = A, thickness = 40) => on("front", material, plate, thickness);
const back = (material = glueB(), plate = B, thickness = 40) => on("back", material, plate, thickness);
const thin = (micrometres = 60) => grindStep(micrometres, 0, { planned: "carrier" });
const letGo = (debondFace: Side | null, overrides: Partial<StepInput> = {}) =>
  debondStep({ planned: "carrier", debondFace, ...overrides });
const heat = (degrees: number, overrides: Partial<StepInput> = {}) =>
  step({ kind: "cure", planned: "carrier", peakTemperature: celsius(degrees), ...overrides });

const between = [front(), thin(), back()];
const reasons = (steps: StepInput[], rule: number, at = steps.length) =>
  findings(flow(steps), rule, { at }).map(({ reason }) => reason);

describe("rule 12, faces", () => {
  it("refuses a debond of a face with nothing bonded", () => {
    const [found] = findings(flow([front(), letGo("back")]), 12);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("nothing to debond on the back side");
    expect(found?.reason).toContain("bonded by its device side");
  });

  it("leaves what such a debond cannot let go where it is", () => {
    const { steps } = walkFlow(flow([front(), letGo("back")]), defaultLimits());
    expect(steps.at(-1)?.after.bonds).toHaveLength(1);
  });

  it("cannot judge which of two carriers goes unless it is said, and takes the first", () => {
    const [found] = findings(flow([...between, letGo(null)]), 12);
    expect(found).toMatchObject({ outcome: "cannot judge" });
    expect(found?.reason).toContain("between Carrier A and Carrier B");
    expect(outcomes(flow([...between, letGo("front")]), 12)).not.toContain("cannot judge");
    expect(outcomes(flow([front(), letGo(null, { planned: "bare" })]), 12)).not.toContain("cannot judge");
    const { steps } = walkFlow(flow([...between, letGo(null)]), defaultLimits());
    expect(steps.at(-1)?.after.bonds.map(({ carrier: { name } }) => name)).toEqual(["Carrier B"]);
  });

  it("refuses a bond to a face that is bonded, by name of the face", () => {
    expect(reasons([back(), back()], 12)[0]).toContain("already bonded to Carrier B by its back side");
    expect(reasons([...between, front()], 12)[0]).toContain("two carriers, Carrier A and Carrier B");
  });

  it("stops work on the face under a carrier: thinning, and films put down or taken off", () => {
    expect(reasons([back(), thin()], 12)[0]).toContain("thins the back side, which is bonded to Carrier B");
    const adds = (side: Side) => [addition({ side })];
    expect(reasons([front(), step({ planned: "carrier", adds: adds("front") })], 12)[0]).toContain("device side");
    expect(reasons([front(), step({ planned: "carrier", adds: adds("back") })], 12)).toEqual([]);
    expect(reasons([back(), step({ planned: "carrier", adds: adds("front") })], 12)).toEqual([]);
  });

  it("finds no face for tape between two carriers", () => {
    expect(reasons([...between, frameStep({ planned: "carrier" })], 12)[0]).toContain("none for the tape");
  });

  it("asks for the clean of the face that was let go", () => {
    expect(reasons([back(), letGo("back", { planned: "bare" })], 12)[0]).toContain("stays on the back side");
  });

  it("holds both carriers against the tool", () => {
    const large = carrier({ name: "Large carrier", diameter: 0.301 });
    expect(reasons([front(), thin(), back(glueB(), large), heat(25)], 12)[0]).toContain("Large carrier");
  });
});

describe("rule 6, both bonding materials", () => {
  const found = (degrees: number) => findings(flow([...between, heat(degrees)]), 6);

  it.each([
    { degrees: 179, worst: ["clear", "clear"] },
    { degrees: 180, worst: ["clear", "caution"] },
    { degrees: 200, worst: ["clear", "caution"] },
    { degrees: 201, worst: ["clear", "do not run"] },
    { degrees: 251, worst: ["do not run", "do not run"] },
  ])("stand $degrees °C, limits 250 and 200 °C, margin 20 K: $worst", ({ degrees, worst }) => {
    expect(found(degrees).map(({ outcome }) => outcome)).toEqual(worst);
    expect(found(degrees).map(({ limit }) => limit?.label)).toEqual([
      "Adhesive A, temperature limit",
      "Adhesive B, temperature limit",
    ]);
  });

  it("are judged at the other one's bond and debond, never at their own", () => {
    const labels = (steps: StepInput[]) => findings(flow(steps), 6).map(({ limit }) => limit?.label);
    expect(labels([front(), thin(), back()])).toEqual(["Adhesive A, temperature limit"]);
    expect(labels([...between, letGo("front")])).toEqual(["Adhesive B, temperature limit"]);
    expect(labels([...between, letGo("back")])).toEqual(["Adhesive A, temperature limit"]);
    expect(labels([front(), letGo("front", { planned: "bare" })])).toEqual([]);
  });

  it("count each its own heatings", () => {
    const cycles = (count: number) => ({ thermalCycles: exact(count), temperatureLimit: exact(celsius(300)) });
    const steps = [front(glueA(cycles(2))), thin(), back(glueB(cycles(1))), heat(150)];
    // The first has seen the second bond and the cure, the second the cure alone: both are exactly what they stand.
    expect(reasons(steps, 6).filter((reason) => reason.startsWith("Heating"))).toEqual([
      expect.stringContaining("Heating 2"),
      expect.stringContaining("Heating 1"),
    ]);
    const once = [front(glueA(cycles(1))), thin(), back(glueB(cycles(1))), heat(150)];
    expect(findings(flow(once), 6).find(({ reason }) => reason.includes("Heating 2"))?.outcome).toBe("do not run");
  });

  it("stop where the clean of one face uses what takes the other bond off", () => {
    const clean = (solvent: StepInput["solvent"]) =>
      step({ kind: "clean", planned: "carrier", exposures: ["solvent"], solvent });
    const steps = (solvent: StepInput["solvent"]) => [
      ...[front(), thin(), back(glueB({ remover: "hydrocarbon" })), letGo("front")],
      clean(solvent),
    ];
    expect(outcomes(flow(steps("hydrocarbon")), 6)).toContain("do not run");
    expect(outcomes(flow(steps("alcohol")), 6)).not.toContain("do not run");
  });
});

describe("rule 7, both carriers", () => {
  it("judges the bow between the two where the second is bonded", () => {
    const glass = carrier({ name: "Glass", material: "glass", expansion: exact(9e-6), youngsModulus: exact(70e9) });
    const bonder = tool({ name: "Bonder", warpLimitEdgesUp: exact(um(1)), warpLimitEdgesDown: exact(um(1)) });
    const second = { ...back(glueB(), glass), equipment: bonder };
    const [found] = findings(flow([front(), thin(), second]), 7);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("Between Carrier A and Glass it lies");
  });

  it("asks the heat of both, and the way of the light of the one that is let go", () => {
    const cool = carrier({ name: "Cool carrier", temperatureLimit: exact(celsius(100)) });
    const hot = findings(flow([front(), thin(), back(glueB(), cool), heat(120)]), 7);
    expect(hot.map(({ reason }) => reason)).toEqual([expect.stringContaining("Cool carrier takes")]);
    const light = (face: Side) =>
      reasons(
        [
          front(glueA(), carrier({ name: "Clear glass", material: "glass", passesUltraviolet: true })),
          thin(),
          back(),
          letGo(face),
        ],
        7,
      );
    expect(light("front")).toEqual([expect.stringContaining("passes Clear glass")]);
    expect(light("back")).toEqual([expect.stringContaining("does not pass Carrier B")]);
  });

  it("holds against the clamp the carrier that it lies on", () => {
    const glass = carrier({ name: "Glass", material: "glass", conductiveCoating: false });
    const clamp = tool({ clamping: "electrostatic" });
    const at = (face: Side) => {
      const [one, other] = face === "front" ? [glass, B] : [A, glass];
      return outcomes(flow([front(glueA(), one), thin(), back(glueB(), other), heat(25, { equipment: clamp })]), 7);
    };
    expect(at("front")).not.toContain("do not run");
    expect(at("back")).toContain("do not run");
  });
});

describe("rule 8, one carrier goes and the other stays", () => {
  it("names the carrier that it stays on", () => {
    expect(findings(flow([...between, letGo("front")]), 8)).toMatchObject([
      { outcome: "clear", reason: "It stays on Carrier B, bonded by its back side." },
    ]);
  });

  it("asks for tape again where the last carrier goes", () => {
    const steps = [...between, letGo("front"), letGo("back", { planned: "bare" })];
    expect(outcomes(flow(steps), 8)).toContain("do not run");
    const onFrame = [...between, letGo("front"), frameStep({ planned: "carrier" }), letGo("back")];
    expect(outcomes(flow(onFrame), 8)).not.toContain("do not run");
  });

  const peels = (force: number | null) =>
    ({ release: "mechanical peel", peelForce: force === null ? null : exact(force) }) as const;
  const both = (one: number | null, other: number | null) =>
    findings(flow([front(glueA(peels(one))), thin(), back(glueB(peels(other))), letGo("front")]), 8);

  it.each([
    { pull: 99, outcome: undefined },
    { pull: 100, outcome: "caution" },
    { pull: 101, outcome: "do not run" },
  ])("a peel of $pull N/m against one that lets go at 100 N/m: $outcome", ({ pull, outcome }) => {
    expect(both(pull, 100).find(({ limit }) => limit?.label === "Adhesive B, peel force")?.outcome).toBe(outcome);
  });

  it("cannot say which of two peels opens where a force is missing", () => {
    expect(both(null, 100)[0]).toMatchObject({ outcome: "caution" });
    expect(both(50, null)[0]?.reason).toContain("which one opens first");
  });

  it("takes the bend of a peel between two carriers for known by nobody", () => {
    const bent = glueA({ ...peels(50), peelRadius: exact(0.05) });
    const steps = [front(bent), thin(), back(), letGo("front")];
    expect(reasons(steps, 8).join(" ")).toContain("how far the two carriers bend");
    expect(findings(flow(steps), 4)).toEqual([]);
    expect(findings(flow([front(bent), letGo("front", { planned: "bare" })]), 4)).toHaveLength(1);
  });

  it("warns of infrared light that passes the silicon to a bond of the same kind", () => {
    const infrared = { releaseLight: "infrared" } as const;
    const steps = (other: Partial<BondingMaterialInput>) => [
      front(glueA(infrared)),
      thin(),
      back(glueB(other)),
      letGo("front"),
    ];
    expect(outcomes(flow(steps(infrared)), 8)).toContain("caution");
    expect(outcomes(flow(steps({})), 8)).toEqual(["clear"]);
  });

  it("asks what a release by solvent does to the other bond", () => {
    const solvent = glueA({ release: "solvent through perforated carrier", remover: "ketone" });
    const steps = (other: Partial<BondingMaterialInput>) => [
      front(solvent),
      thin(),
      back(glueB(other)),
      letGo("front"),
    ];
    expect(outcomes(flow(steps({})), 8)).toEqual(["clear"]);
    expect(outcomes(flow(steps({ resistances: { ...STANDS_ALL, attackedBy: ["ketone"] } })), 8)).toContain(
      "do not run",
    );
    expect(outcomes(flow(steps({ resistances: null })), 8)).toContain("cannot judge");
  });

  it("asks bumps only of the peel of the device side", () => {
    const bumps = step({ kind: "reflow", bumps: { height: exact(um(20)) } });
    const steps = (face: Side) => [
      bumps,
      front(glueA(peels(50))),
      thin(),
      back(glueB({ ...peels(50), peelRadius: exact(0.05) })),
      letGo(face),
    ];
    expect(reasons(steps("front"), 8).join(" ")).toContain("the force that the bumps stand");
    expect(reasons(steps("back"), 8).join(" ")).not.toContain("bumps stand");
  });
});

describe("rule 9, what stands on the bonded face", () => {
  const vias = (protrusion: number | null): StepInput =>
    step({
      kind: "via reveal",
      planned: "carrier",
      siliconAfter: exact(um(50), um(0)),
      ...(protrusion === null ? {} : { viaProtrusion: exact(um(protrusion)) }),
    });
  const onVias = (protrusion: number | null, cover = 40) =>
    findings(flow([front(), thin(), vias(protrusion), back(glueB(), B, cover)]), 9);

  it.each([
    { cover: 16, outcome: "clear" },
    { cover: 10, outcome: "caution" },
    { cover: 9.9, outcome: "do not run" },
  ])("vias of 5 µm in $cover µm, at least 5 µm left: $outcome", ({ cover, outcome }) => {
    expect(onVias(5, cover)).toMatchObject([{ outcome, reason: expect.stringContaining("Vias of 5") }]);
  });

  it("cannot judge vias of unknown height, and says nothing where there are none", () => {
    expect(onVias(null)).toMatchObject([{ outcome: "cannot judge" }]);
    expect(onVias(0)).toEqual([]);
    expect(findings(flow(between), 9)).toEqual([]);
  });

  it("leaves the bumps of the device side out of a bond of the back side", () => {
    const bumps = step({ kind: "reflow", bumps: { height: exact(um(60)) } });
    expect(findings(flow([bumps, back()]), 9)).toEqual([]);
    expect(outcomes(flow([bumps, front()]), 9)).toEqual(["do not run"]);
  });

  it("asks the dicing tape for its depth where it goes on the device side", () => {
    const bumps = step({ kind: "reflow", bumps: { height: exact(um(20)) } });
    const mount = (depth: number | null) =>
      frameStep({
        planned: "carrier",
        tape: { name: "Dicing tape", embeddingDepth: depth === null ? null : exact(um(depth)) },
      });
    expect(outcomes(flow([bumps, back(), mount(null)]), 9)).toEqual(["cannot judge"]);
    expect(outcomes(flow([bumps, back(), mount(0)]), 9)).toEqual(["do not run"]);
    expect(outcomes(flow([bumps, back(), mount(40)]), 9)).toEqual(["clear"]);
    expect(outcomes(flow([bumps, front(), mount(null)]), 9)).toEqual([]);
  });
});

describe("the wafer as it lies", () => {
  const lies = (steps: StepInput[]) => walkFlow(flow(steps), defaultLimits()).steps.map(({ after }) => after.faceUp);

  it("has the face up that is away from its carrier, or from the frame that its device side is on", () => {
    expect(lies([back(), frameStep({ planned: "carrier" }), letGo("back", { planned: "film frame" })])).toEqual([
      "device side",
      "device side",
      "back side",
    ]);
    expect(lies([front(), frameStep({ planned: "carrier" }), letGo("front", { planned: "film frame" })])).toEqual([
      "back side",
      "back side",
      "device side",
    ]);
  });

  it("is said by its name: pair, or between its carriers", () => {
    const slots = { kind: "store", planned: "carrier", equipment: tool({ clamping: "ledges" }) } as const;
    expect(reasons([front(), step(slots)], 5)[0]).toMatch(/^The pair sags/);
    expect(reasons([...between, step(slots)], 5)[0]).toMatch(/^The wafer between its carriers sags/);
  });

  it("weighs with both carriers", () => {
    const robot = tool({ weightLimit: exact(1), totalThicknessLimit: exact(0.01) });
    const weight = (steps: StepInput[]) =>
      findings(flow([...steps, step({ planned: "carrier", equipment: robot })]), 5).map(
        ({ figures }) => figures[0]?.value,
      );
    const [one, oneThick] = weight([front(), thin()]);
    const [two, twoThick] = weight(between);
    expect((two ?? 0) - (one ?? 0)).toBeGreaterThan(0.05);
    expect((twoThick ?? 0) - (oneThick ?? 0)).toBeCloseTo(um(725 + 40), 9);
  });

  it("is soft at peak by the bonding material that is, by its name between two", () => {
    const soft = glueB({ softening: exact(celsius(120)) });
    const free = heat(150, { equipment: tool({ atPeak: "free" }) });
    expect(reasons([front(), thin(), back(soft), free], 14)).toEqual([
      "At 150\u00A0°C Adhesive B is above its softening point, 120\u00A0°C: the shape of the wafer between its carriers at peak is informative only.",
    ]);
  });

  it("has its device side covered by a carrier there, not by one on its back side", () => {
    const touched = (steps: StepInput[]) =>
      outcomes(
        flow([
          step({ adds: [addition()] }),
          ...steps,
          step({ planned: "carrier", contact: { face: "front", means: "pad" } }),
        ]),
        18,
      );
    expect(touched([front()])).toEqual([]);
    expect(touched(between)).toEqual([]);
    expect(touched([back()])).toEqual(["caution"]);
  });
});

describe("the finder at the second bond", () => {
  it("tries carriers on the back side and keeps the face", () => {
    const byInfrared = glueA({ releaseLight: "infrared" });
    const steps = [front(byInfrared), thin(), back(), letGo("front"), step({ kind: "clean", planned: "carrier" })];
    const other = carrier({ id: "c", name: "Carrier C", temperatureLimit: exact(celsius(100)) });
    const found = findBonds(
      flow(steps),
      defaultLimits(),
      { carriers: [B, other], materials: [{ material: glueB(), leastThickness: um(40), mostThickness: um(40) }] },
      { bond: 1 },
    );
    expect(found.span).toEqual({ from: 3, to: null, face: "back" });
    expect(found.tried.find(({ carrier: { name } }) => name === "Carrier C")?.misfit?.finding?.rule).toBe(7);
    expect(found.tried.find(({ planned }) => planned)?.misfit).toBeNull();
  });
});

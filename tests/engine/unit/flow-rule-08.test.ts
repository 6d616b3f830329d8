import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import {
  addition,
  adhesive,
  bondStep,
  celsius,
  debondStep,
  exact,
  film,
  findings,
  flow,
  frameStep,
  outcomes,
  step,
  tapeStep,
  um,
} from "./flow-samples.ts";

const thin = (micrometres = 100): StepInput =>
  step({ kind: "grind", planned: "carrier", siliconAfter: exact(um(micrometres), um(3)) });
const thinOnTape = (micrometres: number): StepInput =>
  step({ kind: "grind", planned: "grinding tape", siliconAfter: exact(um(micrometres), um(0)) });
const onBack = (bond: StepInput): StepInput => ({ ...bond, bond: bond.bond && { ...bond.bond, face: "back" } });
const onFrame = frameStep({ planned: "carrier" });

describe("rule 8, debond on tape or ring", () => {
  it("is clear when the wafer is on its frame before the debond", () => {
    const steps = [bondStep(), thin(), onFrame, debondStep()];
    expect(outcomes(flow(steps), 8, { at: 3 })).toEqual(["clear"]);
    expect(outcomes(flow(steps), 8)).toEqual(["clear", "clear"]);
  });

  it("stops a thin wafer that would leave its carrier free", () => {
    const [found] = findings(flow([bondStep(), thin(), debondStep({ planned: "bare" })]), 8);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("leave its carrier free at 97");
  });

  it("stops it also when the frame comes only afterwards", () => {
    expect(outcomes(flow([bondStep(), thin(), debondStep(), frameStep()]), 8, { at: 3 })).toContain("do not run");
  });

  it("lets a wafer that is thick enough leave without tape", () => {
    expect(outcomes(flow([bondStep(), debondStep({ planned: "bare" })]), 8)).toEqual(["clear"]);
  });

  it.each([
    { peak: 79, outcome: "clear" },
    { peak: 80, outcome: "caution" },
    { peak: 81, outcome: "do not run" },
  ])("a debond at $peak °C on tape that takes 80 °C: $outcome", ({ peak, outcome }) => {
    const steps = [bondStep(), thin(), onFrame, debondStep({ peakTemperature: celsius(peak) })];
    const [, heat] = findings(flow(steps), 8);
    expect(heat).toMatchObject({ outcome, limit: { value: celsius(80) } });
  });

  it("never passes a peel in silence", () => {
    const steps = [bondStep({}, adhesive({ release: "mechanical peel" })), thin(), onFrame, debondStep()];
    expect(outcomes(flow(steps), 8)).toEqual(["clear", "clear", "caution"]);
  });

  it("warns of the remover on tape, after a debond only and with solvent only", () => {
    const before = [bondStep(), thin(), onFrame, debondStep()];
    const clean = (exposures: StepInput["exposures"], planned: StepInput["planned"] = "film frame") =>
      step({ kind: "clean", planned, exposures });
    expect(outcomes(flow([...before, clean(["solvent"])]), 8)).toEqual(["caution"]);
    expect(outcomes(flow([...before, clean(["water"])]), 8)).toEqual([]);
    expect(outcomes(flow([clean(["solvent"], "bare")]), 8)).toEqual([]);
  });

  it("finds the way from grinding tape to frame in line clear", () => {
    const [found] = findings(flow([tapeStep(), frameStep()]), 8);
    expect(found).toMatchObject({ outcome: "clear" });
    expect(found?.reason).toContain("never free between the two");
  });

  it("says nothing of a debond of what is not bonded: that is the order rule's", () => {
    expect(findings(flow([debondStep({ planned: "bare" })]), 8)).toEqual([]);
  });

  it("stops a thin wafer whose transfer from tape to frame is not in line", () => {
    const apart = (micrometres: number) =>
      outcomes(flow([tapeStep(), thinOnTape(micrometres), frameStep({ inLine: false })]), 8);
    expect(apart(100)).toEqual(["do not run"]);
    expect(apart(400)).toEqual(["clear"]);
  });

  const bumped = (standsPeelForce: number | null): StepInput =>
    step({
      kind: "reflow",
      bumps: { height: exact(um(20)), standsPeelForce: standsPeelForce === null ? null : exact(standsPeelForce) },
    });
  const peeled = (peelForce: number | null, stands: number | null, radius: number | null = 0.05) => {
    const material = adhesive({
      release: "mechanical peel",
      peelForce: peelForce === null ? null : exact(peelForce),
      peelRadius: radius === null ? null : exact(radius),
    });
    return findings(flow([bumped(stands), bondStep({}, material), thin(), onFrame, debondStep()]), 8).at(-1);
  };

  it.each([
    { force: 79, outcome: "clear" },
    { force: 80, outcome: "caution" },
    { force: 100, outcome: "caution" },
    { force: 101, outcome: "do not run" },
  ])("a peel of $force N/m on bumps that stand 100 N/m: $outcome", ({ force, outcome }) => {
    expect(peeled(force, 100)).toMatchObject({ outcome, limit: { value: 100 } });
  });

  it("asks for what is missing, and stops where what is known is enough to stop", () => {
    expect(peeled(null, null, null)?.reason).toContain(
      "the bend radius at the peel front, the peel force and the force that the bumps stand are not given",
    );
    expect(peeled(10, 100, null)).toMatchObject({ outcome: "caution" });
    expect(peeled(200, 100, null)).toMatchObject({ outcome: "do not run" });
  });

  it.each([
    { peak: 199, outcome: "clear" },
    { peak: 200, outcome: "caution" },
    { peak: 220, outcome: "caution" },
    { peak: 221, outcome: "do not run" },
  ])("a debond at $peak °C over solder that melts at 220 °C, margin 20 K: $outcome", ({ peak, outcome }) => {
    const solder = film({ kind: "solder", temperatureLimit: exact(celsius(220)) });
    const steps = [
      step({ adds: [addition({ film: solder })] }),
      bondStep(),
      debondStep({ planned: "bare", peakTemperature: celsius(peak) }),
    ];
    expect(findings(flow(steps), 8).find(({ reason }) => reason.includes("melting"))).toMatchObject({ outcome });
  });

  it("is a caution where a slide drags bumps", () => {
    const steps = [bumped(null), bondStep({}, adhesive({ release: "thermal slide" })), thin(), onFrame, debondStep()];
    expect(findings(flow(steps), 8).at(-1)?.reason).toContain("embedded 20");
  });

  it.each([
    { word: "resists", outcome: "clear" },
    { word: "attacked", outcome: "do not run" },
    { word: "unknown", outcome: "caution" },
  ] as const)("a remover on dicing tape that is stated $word: $outcome", ({ word, outcome }) => {
    const frame = frameStep({ planned: "carrier", tape: { name: "Dicing tape", resistances: { solvent: { word } } } });
    const clean = step({ kind: "clean", planned: "film frame", exposures: ["solvent"] });
    expect(outcomes(flow([bondStep(), thin(), frame, debondStep(), clean]), 8)).toEqual([outcome]);
  });

  it("holds the debond's heat against the tape's own limit", () => {
    const frame = frameStep({ planned: "carrier", tape: { name: "Hot tape", temperatureLimit: exact(celsius(120)) } });
    const steps = [bondStep(), thin(), frame, debondStep({ peakTemperature: celsius(100) })];
    expect(findings(flow(steps), 8)[1]).toMatchObject({ outcome: "clear", limit: { value: celsius(120) } });
  });

  it("leaves the first debond of a transfer to the carrier that stays", () => {
    const steps = [bondStep(), onBack(bondStep()), debondStep({ planned: "carrier" })];
    expect(findings(flow(steps), 8)).toMatchObject([
      { outcome: "clear", reason: expect.stringContaining("It stays on") },
    ]);
  });
});

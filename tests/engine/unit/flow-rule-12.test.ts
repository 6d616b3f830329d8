import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import {
  addition,
  bondStep,
  carrier,
  celsius,
  debondStep,
  exact,
  film,
  findings,
  flow,
  frameStep,
  grindStep,
  outcomes,
  step,
  tapeStep,
  tool,
  um,
} from "./flow-samples.ts";

const reasons = (steps: StepInput[], at = steps.length) =>
  findings(flow(steps), 12, { at }).map(({ reason }) => reason);

/** Steps that are in order up to the last one, the fault of that, and words of the sentence that names it. */
const faults: { fault: string; steps: StepInput[]; says: string }[] = [
  {
    fault: "leaves more silicon than there is",
    steps: [tapeStep(), grindStep(100, 3), grindStep(110, 3)],
    says: "should leave 110\u00a0µm of silicon, but only 100\u00a0µm are there",
  },
  {
    fault: "debonds what is not bonded",
    steps: [step(), debondStep({ planned: "bare" })],
    says: "nothing to debond",
  },
  { fault: "bonds twice", steps: [bondStep(), bondStep()], says: "already bonded to Silicon carrier" },
  {
    fault: "bonds to nothing",
    steps: [step(), step({ kind: "bond", planned: "bare" })],
    says: "No carrier and bonding material",
  },
  {
    fault: "plans a carrier that it is not on",
    steps: [step({ planned: "carrier" })],
    says: "A carrier is planned, but the wafer is not bonded",
  },
  {
    fault: "forgets the carrier that it is on",
    steps: [bondStep(), step({ planned: "bare" })],
    says: "still bonded to Silicon carrier, but bare is planned",
  },
  {
    fault: "plans tape that was not laminated",
    steps: [step({ planned: "grinding tape" })],
    says: "A grinding tape is planned, but the wafer was not put on one",
  },
  {
    fault: "plans a frame that it was not mounted on",
    steps: [step({ planned: "film frame" })],
    says: "A film frame is planned",
  },
  {
    fault: "plans a ring that it was not mounted on",
    steps: [step({ planned: "edge ring" })],
    says: "An edge ring is planned",
  },
  { fault: "dices without a frame", steps: [step(), step({ kind: "dice" })], says: "diced without a frame" },
  {
    fault: "dices on grinding tape",
    steps: [tapeStep(), step({ kind: "dice", planned: "grinding tape" })],
    says: "diced without a frame",
  },
  {
    fault: "works on a diced wafer",
    steps: [
      frameStep(),
      step({ kind: "dice", planned: "film frame" }),
      step({ kind: "polish", planned: "film frame" }),
    ],
    says: "already diced",
  },
  {
    fault: "heats tape",
    steps: [tapeStep(), step({ planned: "grinding tape", peakTemperature: celsius(81) })],
    says: "on grinding tape, which takes 80\u00a0°C; the step reaches 81\u00a0°C",
  },
  {
    fault: "takes tape into vacuum",
    steps: [tapeStep(), step({ planned: "grinding tape", exposures: ["vacuum"] })],
    says: "does not go into vacuum or plasma",
  },
  {
    fault: "heats the frame under a pair",
    steps: [bondStep(), frameStep({ planned: "carrier" }), step({ planned: "carrier", peakTemperature: celsius(150) })],
    says: "on film frame, which takes 80",
  },
  {
    fault: "trims after grinding",
    steps: [
      tapeStep(),
      grindStep(100, 3),
      step({ kind: "edge trim", planned: "grinding tape", edgeTrim: { width: exact(5e-4), depth: exact(um(50)) } }),
    ],
    says: "the knife edge is already there",
  },
  {
    fault: "removes a film that is not there",
    steps: [step(), step({ removes: [{ side: "front", filmId: "film", filmName: "Seed" }] })],
    says: "removes Seed from the front side, where there is none",
  },
  {
    fault: "removes one film twice",
    steps: [
      step({ adds: [addition()] }),
      step({ removes: [1, 2].map(() => ({ side: "front" as const, filmId: "film", filmName: "Seed" })) }),
    ],
    says: "removes Seed",
  },
  {
    fault: "does not fit its tool",
    steps: [step({ equipment: tool({ name: "Coater", largestDiameter: exact(0.15) }) })],
    says: "The wafer measures 200\u00a0mm; coater takes 150\u00a0mm",
  },
  {
    fault: "has a carrier that does not fit the tool",
    steps: [bondStep({ equipment: tool({ largestDiameter: exact(0.2) }) }, undefined, carrier({ diameter: 0.3 }))],
    says: "Silicon carrier measures 300\u00a0mm",
  },
  {
    fault: "has a carrier smaller than the wafer",
    steps: [bondStep({}, undefined, carrier({ diameter: 0.15 }))],
    says: "the edge would hang free",
  },
];

describe("rule 12, order of the steps", () => {
  it.each(faults)("does not run a step that $fault", ({ steps, says }) => {
    const found = findings(flow(steps), 12).filter(({ outcome }) => outcome === "do not run");
    expect(found.map(({ reason }) => reason).join(" ")).toContain(says);
    expect(found.every(({ remedy }) => remedy !== null)).toBe(true);
    // What comes before the fault is in order.
    const before = steps.slice(0, -1).flatMap((_, index) => outcomes(flow(steps), 12, { at: index + 1 }));
    expect(before).not.toContain("do not run");
  });

  it("takes tape at exactly its temperature with caution, and an edge ring hotter", () => {
    const at80 = [tapeStep(), step({ planned: "grinding tape", peakTemperature: celsius(80) })];
    expect(outcomes(flow(at80), 12)).toEqual(["caution"]);
    const ring = [frameStep({ planned: "edge ring" }), step({ planned: "edge ring", peakTemperature: celsius(150) })];
    expect(outcomes(flow(ring), 12)).toEqual([]);
  });

  it("leaves the heat of a debond on tape to the debond rule", () => {
    const steps = [bondStep(), frameStep({ planned: "carrier" }), debondStep({ peakTemperature: celsius(200) })];
    expect(outcomes(flow(steps), 12)).not.toContain("do not run");
  });

  it("lets a step remove and put back the same film", () => {
    const seed = addition({ film: film({ id: "seed", name: "Seed" }) });
    const removal = { side: "front" as const, filmId: "seed", filmName: "Seed" };
    expect(reasons([step({ adds: [seed] }), step({ removes: [removal], adds: [{ ...seed, coverage: 0.3 }] })])).toEqual(
      [],
    );
  });

  it("asks for a clean after the debond, moves and measurements aside", () => {
    const debonded = [bondStep(), frameStep({ planned: "carrier" }), debondStep()];
    const onFrame = (kind: StepInput["kind"]) => step({ kind, planned: "film frame" });
    const at = { at: 3 };
    expect(outcomes(flow(debonded), 12, at)).toEqual(["caution"]);
    expect(outcomes(flow([...debonded, onFrame("dice")]), 12, at)).toEqual(["caution"]);
    expect(outcomes(flow([...debonded, onFrame("measure"), onFrame("clean")]), 12, at)).toEqual(["clear"]);
  });

  it("says that bond, debond and dicing are in order when they are", () => {
    const steps = [
      bondStep(),
      frameStep({ planned: "carrier" }),
      debondStep(),
      step({ kind: "clean", planned: "film frame" }),
      step({ kind: "dice", planned: "film frame" }),
    ];
    expect([1, 3, 5].map((at) => outcomes(flow(steps), 12, { at }))).toEqual([["clear"], ["clear"], ["clear"]]);
  });

  it("takes a thickness that is exactly what is there", () => {
    expect(reasons([step({ siliconAfter: exact(725 * 1e-6, um(3)) })])).toEqual([]);
  });

  const onBack = (bond: StepInput): StepInput => ({ ...bond, bond: bond.bond && { ...bond.bond, face: "back" } });

  it("allows a transfer: the other face is bonded before the first carrier goes", () => {
    const steps = [
      bondStep(),
      step({ kind: "grind", planned: "carrier", siliconAfter: exact(um(50), um(0)) }),
      onBack(bondStep()),
      debondStep({ planned: "carrier" }),
      step({ kind: "clean", planned: "carrier" }),
    ];
    for (const [index] of steps.entries())
      expect(outcomes(flow(steps), 12, { at: index + 1 })).not.toContain("do not run");
  });

  it("stops a third carrier, and a second one on the same face", () => {
    expect(reasons([bondStep(), onBack(bondStep()), onBack(bondStep())])[0]).toContain("already has two carriers");
    expect(reasons([onBack(bondStep()), onBack(bondStep())])[0]).toContain("already bonded");
  });
});

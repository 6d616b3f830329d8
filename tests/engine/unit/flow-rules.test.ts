import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { bondedFace } from "#app/engine/flow/bond.ts";
import { WAFER_KINDS } from "#app/engine/flow/handling-inputs.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits, LIMIT_DEFINITIONS, type LimitDefinition, type LimitKey } from "#app/engine/rules/limits.ts";
import { rankBendingSteps } from "#app/engine/rules/rank-bending.ts";
import { DESCRIBED_RULES } from "#app/engine/rules/described-rules.ts";
import { RULES } from "#app/engine/rules/rules.ts";
import { sharedBy } from "#app/engine/rules/share-beyond.ts";
import {
  adhesive,
  bondStep,
  debondStep,
  exact,
  flow,
  frameStep,
  grindStep,
  reliefStep,
  step,
  tapeStep,
  trimStep,
  um,
} from "./flow-samples.ts";

const limits = defaultLimits();

describe("the handling rules", () => {
  it("are eighteen, in the order of their numbers, each with a title and a question", () => {
    expect(RULES.map(({ number }) => number)).toEqual(Array.from({ length: 18 }, (_, index) => index + 1));
    for (const { title, asks } of DESCRIBED_RULES) {
      expect(title.length).toBeGreaterThan(3);
      expect(asks).toMatch(/[?.]$/);
    }
  });

  it("read limits that there are, and leave none unread", () => {
    const read = new Set(DESCRIBED_RULES.flatMap((rule) => rule.limits));
    const defined = Object.keys(LIMIT_DEFINITIONS) as LimitKey[];
    expect([...read].sort()).toEqual([...defined].sort());
  });

  it("have limits that say where they come from", () => {
    const definitions: LimitDefinition[] = Object.values(LIMIT_DEFINITIONS);
    for (const { value, source, title, rule } of definitions) {
      expect(value).toBeGreaterThan(0);
      expect(source).toBe("common practice, no source");
      expect(title.length).toBeGreaterThan(3);
      expect(RULES.some(({ number }) => number === rule)).toBe(true);
    }
  });
});

describe("what is out of scope", () => {
  it.each(WAFER_KINDS.filter((kind) => kind !== "silicon wafer"))("a %s is refused by name", (kind) => {
    const input = flow([step()]);
    const other = { ...input, wafer: { ...input.wafer, kind } };
    expect(() => walkFlow(other, limits)).toThrow(EngineInputError);
    expect(() => assessFlow(other, limits)).toThrow(`a ${kind} is out of scope`);
  });

  it("a silicon wafer is not, said or unsaid", () => {
    const input = flow([step()]);
    for (const kind of ["silicon wafer", null, undefined] as const)
      expect(assessFlow({ ...input, wafer: { ...input.wafer, kind } }, limits).verdict.outcome).toBe("clear");
  });
});

describe("the wafer through a transfer", () => {
  it("lies on the carrier that stays, the other face up", () => {
    const back = bondStep();
    const steps = [
      bondStep(),
      { ...back, bond: back.bond && { ...back.bond, face: "back" as const } },
      debondStep({ planned: "carrier" }),
      debondStep(),
    ];
    const states = walkFlow(flow(steps), limits).steps.map(({ after }) => after);
    expect(states.map(({ bonds }) => bonds.map(bondedFace))).toEqual([["front"], ["front", "back"], ["back"], []]);
    expect(states.map(({ faceUp }) => faceUp)).toEqual(["back side", "device side", "device side", "device side"]);
  });
});

describe("tape, bumps and relief are carried along", () => {
  it("until the tape is off, and until the next grind", () => {
    const tape = { name: "Tape" };
    const steps = [
      step({ bumps: { height: exact(um(30)) } }),
      tapeStep({ tape }),
      grindStep(200, 0),
      reliefStep(),
      grindStep(100, 0),
      frameStep(),
    ];
    const states = walkFlow(flow(steps), limits).steps.map(({ after }) => after);
    expect(states.map((after) => after.tape?.name ?? null)).toEqual([null, "Tape", "Tape", "Tape", "Tape", null]);
    expect(states.map(({ relieved }) => relieved)).toEqual([false, false, false, true, false, false]);
    expect(states.every(({ bumps }) => bumps?.height.value === um(30))).toBe(true);
  });
});

describe("ranking of steps by strength", () => {
  it("puts the most stressed step first, and predicts nothing where there is no stress", () => {
    const peeled = flow([
      bondStep({}, adhesive({ release: "mechanical peel", peelRadius: exact(0.05) })),
      frameStep({ planned: "carrier" }),
      debondStep(),
    ]);
    const strength = { characteristicStrength: 300e6, weibullModulus: 5 };
    const [first, ...rest] = rankBendingSteps(assessFlow(peeled, limits), strength);
    expect(first).toMatchObject({ step: 3 });
    expect(first?.probability).toBeGreaterThan(0);
    expect(rest).toEqual([]);
    expect(rankBendingSteps(assessFlow(flow([step()]), limits), strength)).toEqual([]);
  });
});

describe("what a share of wafers rests on", () => {
  it("names the assumed inputs, else what moves it most", () => {
    const budget = [
      { input: "Glass, expansion", source: "supplier" as const },
      { input: "Seed, stress", source: "assumed" as const },
    ];
    expect(sharedBy(budget)).toBe("Assumed: Seed, stress.");
    expect(sharedBy(budget.slice(0, 1))).toBe("It rests most on Glass, expansion.");
    expect(sharedBy([])).toBe("");
  });
});

describe("a long flow", () => {
  it("of 300 steps is judged at every step", () => {
    const block = [trimStep(), ...Array.from({ length: 298 }, () => step({ exposures: ["water"] })), step()];
    const { steps, findings } = assessFlow(flow(block), limits);
    expect(steps).toHaveLength(300);
    expect(findings.every(({ outcome }) => outcome === "clear")).toBe(true);
  });
});

import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { BLANK_STEP } from "#app/lib/blank-step.ts";
import { readChangeForm } from "#app/lib/change-request-form.ts";
import { SITE_SUBJECTS, subjectKey, withChange } from "#app/lib/change-request.ts";
import { reachSentence } from "#app/lib/change-reach-words.ts";
import { customerChange } from "#app/lib/customer-change.ts";
import { movementOf } from "#app/lib/result-comparison.ts";
import type { Change, ChangeSubject, TouchedFlow } from "#app/schemas/change-request.ts";
import type { FlowDetail, StepDetail } from "#app/schemas/flow-view.ts";
import { demoResult } from "#tests/fixtures/demo-assessment.ts";
import { demoFlow } from "#tests/fixtures/demo-flow-input.ts";

/** A demo flow as the database would give it; the films of `own` state a stress of their own. */
function detail(name: string, own: readonly string[] = []): FlowDetail {
  const { flow }: { flow: FlowInput } = demoFlow(name);
  return {
    id: name,
    name,
    note: "",
    program: { id: "p", name: "Tern", slug: "tern" },
    silicon: { id: "s", name: "Silicon (001)", diameter: flow.wafer.diameter, orientation: "100" },
    incomingThickness: flow.wafer.thickness,
    waferKind: "silicon wafer",
    incomingBowAlong: null,
    incomingBowAcross: null,
    incomingFilmShare: null,
    gateBow: null,
    gateWarp: null,
    steps: flow.steps.map((step, index) => stepDetail(step, index, own)),
    stamp: { version: 1, updatedAt: "2026-12-01T00:00:00.000Z", updatedBy: "Ines Varga" },
    mayEdit: true,
    mayAssess: true,
  };
}

const stepDetail = (step: StepInput, index: number, own: readonly string[]): StepDetail => ({
  ...step,
  id: String(index),
  handling: BLANK_STEP.handling,
  tape: null,
  trimWidth: null,
  trimDepth: null,
  carrier: step.bond?.carrier ?? null,
  bondingMaterial: step.bond?.material ?? null,
  bondThickness: step.bond?.thickness ?? null,
  films: step.adds.map(({ side, film, thickness, stress, coverage }) => ({
    change: "adds",
    side,
    film,
    thickness,
    ownStress: own.includes(film.name) ? stress : null,
    stress,
    stressRecord: null,
    coverage,
    lines: null,
  })),
});

const firstFilm = detail("Petrel").steps.flatMap(({ films }) => films)[0]?.film.name ?? "";
const about = (subject: ChangeSubject, property: string, value: number, title = ""): Change => ({
  subject,
  property,
  value,
  title,
});
const film = { kind: "film", id: firstFilm, name: firstFilm } as const;

describe("a change made to a flow", () => {
  it("sets a film's stress where the step takes the film's, and leaves the original alone", () => {
    const flow = detail("Petrel");
    const changed = withChange(flow, defaultLimits(), about(film, "stress", 99e6));
    const stresses = (of: FlowDetail) =>
      of.steps.flatMap(({ films }) =>
        films.filter((each) => each.film.id === firstFilm).map(({ stress }) => stress.value),
      );
    expect(new Set(stresses(changed?.flow ?? flow))).toEqual(new Set([99e6]));
    expect(stresses(flow)).not.toContain(99e6);
  });

  it("does not touch a flow whose steps state a stress of their own, or that has nothing of it", () => {
    expect(withChange(detail("Petrel", [firstFilm]), defaultLimits(), about(film, "stress", 99e6))).toBeNull();
    const nobody = { kind: "carrier", id: "none", name: "none" } as const;
    expect(withChange(detail("Petrel"), defaultLimits(), about(nobody, "expansion", 3e-6))).toBeNull();
  });

  it("sets a property of a carrier, bonding material and tool, keeping the tolerance", () => {
    const flow = detail("Petrel");
    const carrier = flow.steps.find((step) => step.carrier)?.carrier;
    if (!carrier) throw new Error("Petrel has no carrier");
    const subject = { kind: "carrier", id: carrier.id, name: carrier.name } as const;
    const changed = withChange(flow, defaultLimits(), about(subject, "expansion", 3.3e-6));
    expect(changed?.flow.steps.find((step) => step.carrier)?.carrier?.expansion).toMatchObject({
      value: 3.3e-6,
      tolerance: null,
    });
  });

  it("sets the peak of the steps of a kind, of those with a word in their name when one is given", () => {
    const flow = detail("Petrel");
    const kind = flow.steps[2]?.kind ?? "cure";
    const subject = { kind: "step", id: kind, name: kind } as const;
    const all = withChange(flow, defaultLimits(), about(subject, "peakTemperature", 473.15));
    expect(
      all?.flow.steps.filter((step) => step.kind === kind).every(({ peakTemperature }) => peakTemperature === 473.15),
    ).toBe(true);
    expect(withChange(flow, defaultLimits(), about(subject, "peakTemperature", 473.15, "no such name"))).toBeNull();
  });

  it("sets a limit of the site", () => {
    const subject = { kind: "limit", id: "warpMargin", name: "" } as const;
    expect(withChange(detail("Tern"), defaultLimits(), about(subject, "value", 0.3))?.limits.warpMargin.value).toBe(
      0.3,
    );
  });
});

describe("a question in an address", () => {
  const subjects: ChangeSubject[] = [film, ...SITE_SUBJECTS];
  const read = (search: string) => readChangeForm(new URLSearchParams(search), subjects);
  const of = `of=${encodeURIComponent(subjectKey(film))}`;

  it("is whole with what, which property and a value with its unit", () => {
    const { change, view } = read(`${of}&property=stress&value=35+MPa`);
    expect(change).toEqual({ subject: film, property: "stress", value: 35e6, title: "" });
    expect(view.question?.replaceAll("\u00A0", " ")).toBe(`${firstFilm}, stress at 25 °C, tension positive: 35 MPa`);
    expect(view.errors).toEqual({});
  });

  it.each([
    ["", {}],
    ["of=film:gone", { of: /no such record/ }],
    [of, {}],
    [`${of}&property=colour&value=3`, { property: /Choose one/ }],
    [`${of}&property=&value=3+MPa`, { property: /Choose what/ }],
    [`${of}&property=stress&value=`, { value: /Blank is missing, not zero/ }],
    [`${of}&property=stress&value=12+parsecs`, { value: /not a unit of stress/ }],
    [`${of}&property=stress&value=99+GPa`, { value: /outside/ }],
    ["of=step:cure&value=-400+C", { value: /./ }],
    ["of=limit:warpMargin&value=-3", { value: /outside 0 to 100/ }],
  ])("'%s' is not, and says why at the field", (search, errors) => {
    const { change, view } = read(search);
    expect(change).toBeNull();
    expect(view.question).toBeNull();
    expect(Object.keys(view.errors)).toEqual(Object.keys(errors));
    for (const [field, said] of Object.entries(errors))
      expect(view.errors[field as keyof typeof view.errors]).toMatch(said as RegExp);
  });

  it("about a kind of step needs no property", () => {
    expect(read("of=step:cure&value=200+C").change).toMatchObject({ property: "peakTemperature", value: 473.15 });
  });
});

describe("what a change reaches", () => {
  const flow = (before: string, after: string): TouchedFlow => ({
    id: before,
    name: before,
    program: { name: "Fulmar", slug: "fulmar" },
    newest: null,
    changes: [
      {
        subject: firstFilm,
        property: "Stress",
        from: "30 MPa",
        to: "35 MPa",
        steps: [3],
        record: { kind: "film", id: firstFilm },
      },
    ],
    movement: movementOf(demoResult(before), demoResult(after)),
  });
  const [same, other] = [flow("Tern", "Tern"), flow("Fulmar A", "Fulmar B")];

  it.each([
    [{ flows: 0, touched: [], more: 0 }, "There are no flows to look at yet."],
    [{ flows: 3, touched: [], more: 0 }, "It touches none of three flows."],
    [{ flows: 3, touched: [same], more: 0 }, "It touches one of three flows. No verdict changes."],
    [{ flows: 1, touched: [other], more: 0 }, "It touches the one flow. The verdict changes in it."],
    [{ flows: 4, touched: [other, same], more: 0 }, "It touches two of four flows. The verdict changes in one."],
    [{ flows: 40, touched: [same], more: 9 }, "It touches ten of 40 flows. No verdict changes among those computed."],
  ])("%#", (reach, sentence) => {
    expect(reachSentence(reach)).toBe(sentence);
  });

  const page = (kind: ChangeSubject["kind"]) =>
    customerChange(
      { flows: 1, touched: [other], more: 0 },
      {
        question: "Wafer bonder, warp limit, edges up: 300 µm",
        kind,
        program: "Fulmar",
        preparedBy: "Ines Varga",
        date: "2026-12-01",
      },
    );

  it("for a customer gives shares of a limit, never a limit, and verdicts before and after", () => {
    const { flows } = page("film");
    expect(flows[0]).toMatchObject({ before: { outcome: "do not run" }, after: { outcome: "caution" } });
    const text = JSON.stringify(flows);
    expect(text).toContain("share 95\u00A0%");
    expect(text).not.toMatch(/takes|200.µm/);
  });

  it("for a customer says nothing of a limit or a tool that changes", () => {
    for (const kind of ["limit", "equipment"] as const) {
      expect(page(kind).question).toBe("A handling limit of the site changes");
      expect(page(kind).flows[0]?.inputs).toEqual([]);
    }
    expect(page("film").flows[0]?.inputs).toHaveLength(1);
  });
});

import { renderToStaticMarkup } from "react-dom/server";
import { createRoutesStub } from "react-router";
import { describe, expect, it } from "vitest";
import { FlowAnswer } from "#app/components/flows/FlowAnswer.tsx";
import { FlowPlan } from "#app/components/flows/FlowPlan.tsx";
import { FlowSteps } from "#app/components/flows/FlowSteps.tsx";
import { planColumns } from "#app/lib/flow-plan.ts";
import { stepRows, type ShownStep } from "#app/lib/flow-rows.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FlowHistory } from "#app/schemas/flow-plan.ts";
import type { FlowAssessmentRow } from "#app/schemas/flow-view.ts";

const stated = (value: number): Measured => ({ value, tolerance: null, source: "supplier" });

const step = (id: string, overrides: Partial<ShownStep> = {}): ShownStep => ({
  id,
  kind: "measure",
  title: `Step called ${id}`,
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
const steps = [step("a"), step("b", { equipment: null }), step("c", { planned: "film frame" })];

const lines: FlowHistory["lines"] = [
  {
    number: 2,
    kind: "edit",
    words: "Moved step 1, Step called b, to 2",
    by: "Ines Varga",
    at: "2026-12-01T10:00:00.000Z",
  },
];

function render(element: React.ReactNode, at = "/"): string {
  const Stub = createRoutesStub([{ path: "/", Component: () => element }]);
  return renderToStaticMarkup(<Stub initialEntries={[at]} />);
}

const table = (options: Partial<Parameters<typeof FlowSteps>[0]> = {}, at?: string) =>
  render(
    <FlowSteps
      flowId="f"
      version={3}
      rows={stepRows(steps, stated(725e-6))}
      history={null}
      mayEdit
      fault={null}
      {...options}
    />,
    at,
  );

describe("the steps of a flow", () => {
  it("lets a reader read and nothing else", () => {
    const markup = table({ mayEdit: false });
    expect(markup).toContain("Step called c");
    expect(markup).not.toContain("<button");
    expect(markup).not.toContain("<form");
    expect(markup).not.toContain("steps/new");
  });

  it("has one form, whose buttons say which step they are about", () => {
    const markup = table();
    expect(markup.match(/<form/g)).toHaveLength(1);
    expect(markup).toContain('name="version" value="3"');
    expect(markup).toContain('aria-label="Move up step 2, Step called b"');
    expect(markup).toContain('value="down a"');
    expect(markup).toContain('value="copy c"');
  });

  it("leaves the first no way up and the last no way down", () => {
    const buttons = table().match(/<button[^>]*value="(up|down) [^>]*>/g) ?? [];
    const off = buttons.filter((button) => button.includes('aria-disabled="true"'));
    expect(off.map((button) => /value="([^"]*)"/.exec(button)?.[1])).toEqual(["up a", "down c"]);
  });

  it("marks the row that was worked on, and says what was done with the way back", () => {
    const moved = table({ history: { undo: "moved step 1", redo: null, lines } }, "/?step=b&done=down");
    expect(moved.match(/aria-current="true"/g)).toHaveLength(1);
    expect(moved).toContain("Moved step 1, Step called b, to 2.");
    expect(moved).toContain('title="Undo: moved step 1"');
    expect(/<button[^>]*value="redo"[^>]*>/.exec(moved)?.[0]).toContain('aria-disabled="true"');
    expect(/<button[^>]*value="undo"[^>]*>/.exec(moved)?.[0]).not.toContain("aria-disabled=");
  });

  it("offers the way back also when no step is left", () => {
    expect(table({ rows: [], history: { undo: "removed step 1", redo: null, lines } })).toContain('value="undo"');
  });

  it("gives the reason at the step that cannot be computed, and names a missing tool", () => {
    const markup = table({ fault: { step: 2, reason: "no silicon would be left" } });
    expect(markup.indexOf("Cannot be computed: no silicon would be left")).toBeGreaterThan(
      markup.indexOf("Step called b"),
    );
    expect(markup.indexOf("Cannot be computed")).toBeLessThan(markup.indexOf("Step called c"));
    expect(markup).toContain("No tool chosen");
  });

  it("says what belongs where nothing is yet", () => {
    expect(table({ rows: [] })).toContain("Add the first step");
    expect(table({ rows: [], mayEdit: false })).not.toContain("Add the first step");
  });
});

describe("the answer of a flow", () => {
  const assessment = (number: number, more: Partial<FlowAssessmentRow> = {}): FlowAssessmentRow => ({
    id: `id-${number}`,
    number,
    outcome: "caution",
    sentences: ["Runs with cautions: no step needs support."],
    createdAt: "2026-12-01T10:00:00.000Z",
    createdBy: "Ines Varga",
    outOfDate: false,
    ...more,
  });
  const answer = (assessments: FlowAssessmentRow[], mayAssess = true) =>
    render(<FlowAnswer assessments={assessments} mayAssess={mayAssess} />);

  it("is the newest assessment, with the older ones beside it", () => {
    const markup = answer([assessment(2), assessment(1, { outcome: "do not run" })]);
    expect(markup).toContain("Open assessment B");
    expect(markup).toContain("Runs with cautions");
    expect(markup).toContain("Earlier assessments");
    expect(markup).toContain("Do not run");
    expect(markup).not.toContain("Out of date");
  });

  it("says that it is old, and asks those who can to assess again", () => {
    expect(answer([assessment(1, { outOfDate: true })])).toContain("Assess it again");
    const reader = answer([assessment(1, { outOfDate: true })], false);
    expect(reader).toContain("Out of date");
    expect(reader).not.toContain("Assess it again");
  });

  it("says that there is none yet", () => {
    expect(answer([])).toContain("Not assessed yet");
    expect(answer([])).not.toContain("Earlier assessments");
  });
});

describe("the plan as a drawing", () => {
  it("shows silicon, temperature and what holds the wafer, without any result", () => {
    const markup = render(<FlowPlan steps={planColumns(steps, stated(725e-6))} />);
    expect(markup).toContain("Support planned");
    expect(markup).toContain("film frame");
    expect(markup).toContain(">725<");
    expect(markup).not.toContain("NaN");
    expect(markup).not.toContain("undefined");
  });
});

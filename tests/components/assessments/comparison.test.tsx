import { createRoutesStub } from "react-router";
import { describe, expect, it } from "vitest";
import { ComparisonPage } from "#app/components/assessments/ComparisonPage.tsx";
import { comparisonView } from "#app/lib/comparison-view.ts";
import type { ComparedAssessment, ComparisonOffer } from "#app/schemas/assessment-comparison.ts";
import { attributes, render, words } from "#tests/components/drawings/render.ts";
import { demoResult } from "#tests/fixtures/demo-assessment.ts";

const FLOW = { id: "f", name: "Fulmar F-1" };

function assessment(number: number, result: string, flow = FLOW): ComparedAssessment {
  return {
    id: `a${number}`,
    number,
    documentNumber: 10 + number,
    flow,
    outcome: demoResult(result).verdict.outcome,
    createdAt: `2026-12-0${number}T08:00:00.000Z`,
    engineVersion: "0.1.0",
    result: demoResult(result),
  };
}

function page(offer: Partial<ComparisonOffer>): string {
  const view = comparisonView({
    asked: assessment(2, "Fulmar B"),
    program: { name: "Fulmar", slug: "fulmar" },
    sameFlow: [assessment(1, "Fulmar A")],
    otherFlows: [],
    chosen: null,
    ...offer,
  });
  const Stub = createRoutesStub([{ path: "/", Component: () => <ComparisonPage view={view} query="" /> }]);
  return render(<Stub initialEntries={["/"]} />);
}

const chosen = { before: assessment(1, "Fulmar A"), after: assessment(2, "Fulmar B"), changes: [] };

describe("two assessments side by side", () => {
  it("gives both answers with revision and number, the older first", () => {
    const text = words(page({ chosen }));
    expect(text).toContain("Revision A and Revision B");
    expect(text).toMatch(
      /Revision A , FULMAR-A011, 2026-12-01 Do not run .* Revision B , FULMAR-A012, 2026-12-02 Caution/,
    );
    expect(text).toContain("The verdict goes from do not run to caution");
  });

  it("says when both rest on the same values, and shows both courses", () => {
    const markup = page({ chosen });
    expect(words(markup)).toContain("Nothing: both rest on the same values.");
    expect(attributes(markup, "aria-label")).toContain("Warp along the flow at 25 °C, Revision A and Revision B");
  });

  it("calls two flows by their names", () => {
    const other = { id: "g", name: "Fulmar F-2, glass" };
    const text = words(page({ chosen: { ...chosen, after: assessment(2, "Fulmar B", other) } }));
    expect(text).toContain("Fulmar F-1 and Fulmar F-2, glass");
    expect(text).toMatch(/FULMAR-A012, revision B, 2026-12-02/);
  });

  it("has every step, and says of one that only one of them has", () => {
    const after = assessment(2, "Fulmar B");
    after.result = { ...after.result, steps: after.result.steps.filter(({ number }) => number !== 13) };
    expect(words(page({ chosen: { ...chosen, after } }))).toContain("no such step");
  });

  it("with nothing to compare says what would be", () => {
    const text = words(page({ sameFlow: [] }));
    expect(text).toContain("Nothing to compare with yet");
    expect(text).toContain("assess it again");
  });
});

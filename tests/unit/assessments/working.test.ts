import { describe, expect, it } from "vitest";
import { selectedStep } from "#app/lib/assessment-selected.ts";
import { assessmentView } from "#app/lib/assessment-view.ts";
import { figureAskedFor } from "#app/lib/assessment-working.ts";
import { DEMO_FLOWS, demoResult, HEAD, PLACE } from "#tests/fixtures/demo-assessment.ts";

const search = (path: string) => new URLSearchParams(path.split("?")[1] ?? "");

describe("the working behind a figure", () => {
  it("is found by every link that an assessment shows", () => {
    for (const flow of DEMO_FLOWS) {
      const result = demoResult(flow);
      const steps = result.steps.flatMap(({ number }) => selectedStep(PLACE, result, number) ?? []);
      const paths = steps.flatMap(({ lies, peak, released, open, clear }) => [
        lies.working,
        peak?.working ?? null,
        released?.working ?? null,
        ...[...open, ...clear].flatMap(({ figures }) => figures.map(({ working }) => working)),
      ]);
      const answer = assessmentView(HEAD, result, null).figures.flatMap(({ link }) =>
        typeof link?.to === "string" && link.to.includes("/working") ? [link.to] : [],
      );
      const links = [...paths, ...answer].filter((path) => path !== null);
      expect(links.length).toBeGreaterThan(20);
      for (const path of links) expect(figureAskedFor(result, search(path)), path).not.toBeNull();
    }
  });

  it("says of which step it is, and the figure as it is shown there", () => {
    const figure = figureAskedFor(demoResult("Tern"), search("?step=15&shape=released"));
    expect(figure).toMatchObject({
      step: { number: 15, title: "Dry polish to 100 um" },
      label: "Shape at 25\u00A0°C if nothing held it",
      working: { equation: "free-wafer-curled" },
    });
    expect(figure?.value).toMatch(/^Rolls up, radius about/);
  });

  it.each([
    "",
    "?finding=1",
    "?finding=abc&figure=0",
    "?finding=99999&figure=0",
    "?finding=-1&figure=0",
    "?finding=0&figure=0",
    "?finding=1e3&figure=0",
    "?step=15&shape=loaded",
    "?step=3&shape=released",
    "?step=3&shape=__proto__",
    "?step=99&shape=loaded",
    "?step=12%20parsecs&shape=loaded",
  ])("is nothing for %j", (address) => {
    expect(figureAskedFor(demoResult("Tern"), search(address))).toBeNull();
  });
});

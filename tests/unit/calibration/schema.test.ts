import { describe, expect, it } from "vitest";
import { calibrationSchema } from "#app/schemas/calibration.ts";
import { send, type Sent } from "../carriers/forms.ts";

const FLOW = "11111111-1111-4111-8111-111111111111";

const rowOf = (row: number, step: string, bow: string, uncertainty: string): Sent => ({
  [`rows[${row}].step`]: step,
  [`rows[${row}].bow`]: bow,
  [`rows[${row}].uncertainty`]: uncertainty,
});
const sent = (...rows: Sent[]): Sent => Object.assign({ flow: FLOW, fit: "both" }, ...rows) as Sent;

describe("the form of a calibration", () => {
  it("passes over blank rows and keeps the place of the others", () => {
    const { value, errors } = send(
      calibrationSchema,
      sent(
        rowOf(0, "", "", ""),
        rowOf(1, "10", "-410 um", "4um"),
        rowOf(2, "", "", ""),
        rowOf(3, "12", "0.2 mm", "1 µm"),
      ),
    );
    expect(errors).toEqual({});
    expect(value?.bows).toEqual([
      { row: 1, step: 10, bow: expect.closeTo(-410e-6, 12), standardUncertainty: expect.closeTo(4e-6, 12) },
      { row: 3, step: 12, bow: expect.closeTo(0.2e-3, 12), standardUncertainty: expect.closeTo(1e-6, 12) },
    ]);
  });

  it("says everything that is wrong at once", () => {
    const { errors } = send(calibrationSchema, sent(rowOf(0, "10", "12 parsecs", "4 um"), rowOf(1, "", "-1 um", "")));
    expect(Object.keys(errors).toSorted()).toEqual(["rows[0].bow", "rows[1].step", "rows[1].uncertainty"]);
  });

  it.each([
    [sent(rowOf(0, "", "", "")), "rows[0].bow", "at least one measured bow"],
    [sent(rowOf(0, "10", "", "4 um")), "rows[0].bow", "Blank is missing, not zero"],
    [sent(rowOf(0, "", "-410 um", "4 um")), "rows[0].step", "Choose the step"],
    [sent(rowOf(0, "10", "-410 um", "")), "rows[0].uncertainty", "its standard uncertainty"],
    [sent(rowOf(0, "10", "-410 um", "0 um")), "rows[0].uncertainty", "outside 10 nm to 20 mm"],
    [sent(rowOf(0, "10", "12 parsecs", "4 um")), "rows[0].bow", "parsecs is not a unit of length"],
    [sent(rowOf(0, "ten", "-410 um", "4 um")), "rows[0].step", "Choose one of the list."],
    [{ ...sent(rowOf(0, "10", "-410 um", "4 um")), fit: "all" }, "fit", "Choose what is to be fitted."],
    [{ ...sent(rowOf(0, "10", "-410 um", "4 um")), flow: "x" }, "flow", "Choose the flow"],
  ])("refuses %j", (form, at, words) => {
    expect(send(calibrationSchema, form).errors[at]?.join(" ")).toContain(words);
  });
});

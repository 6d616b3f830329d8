import { describe, expect, it } from "vitest";
import { flowSchema } from "#app/schemas/flow.ts";
import { flowInputOf } from "#app/services/flows/flow-inputs.ts";
import { property, send, type Sent } from "../carriers/forms.ts";

const PROGRAM = "11111111-1111-4111-8111-111111111111";
const SILICON = "22222222-2222-4222-8222-222222222222";

const FLOW: Sent = {
  name: "Petrel P-3",
  program: PROGRAM,
  silicon: SILICON,
  ...property("incomingThickness", "775 um"),
  ...property("incomingBowAlong", "-90 um", { tolerance: "5 um" }),
  ...property("incomingBowAcross", "-80 um"),
  ...property("incomingFilmShare", "80 %", { tolerance: "10 %" }),
};

/** What the engine takes of a posted head, without steps. */
function incomingOf(sent: Sent) {
  const { value, errors } = send(flowSchema, sent);
  expect(errors).toEqual({});
  if (!value) throw new Error("not read");
  const silicon = { id: SILICON, name: "Silicon (001), 300 mm", diameter: 0.3, orientation: "100" as const };
  return flowInputOf({ ...value, silicon, steps: [] }).wafer.incoming;
}

describe("the shape that a wafer comes in with", () => {
  it("reaches the engine as curvatures, a dome with the device side up as a negative one", () => {
    const shape = incomingOf(FLOW);
    expect(shape?.curvature.x).toMatchObject({
      value: expect.closeTo((2 * 90e-6) / 0.15 ** 2, 9),
      tolerance: expect.closeTo((2 * 5e-6) / 0.15 ** 2, 9),
      source: "supplier",
    });
    expect(shape?.curvature.y).toMatchObject({ value: expect.closeTo((2 * 80e-6) / 0.15 ** 2, 9), tolerance: null });
    expect(shape?.filmShare).toMatchObject({ value: expect.closeTo(0.8, 12) });
  });

  it("has an unknown film share when that is blank, and is no shape when all of it is", () => {
    const unknown = { ...FLOW, ...property("incomingFilmShare", "", { tolerance: "" }) };
    expect(incomingOf(unknown)).toMatchObject({ filmShare: null });
    const { "incomingBowAlong.value": _along, "incomingBowAlong.tolerance": _tolerance, ...flat } = unknown;
    expect(incomingOf({ ...flat, "incomingBowAcross.value": "" })).toBeNull();
  });

  it.each([
    [{ "incomingBowAcross.value": "" }, "incomingBowAcross.value", "Type the bow across as well"],
    [{ "incomingBowAlong.value": "12 parsecs" }, "incomingBowAlong.value", "parsecs is not a unit of length"],
    [{ "incomingBowAlong.value": "3 m" }, "incomingBowAlong.value", "outside −20 mm to 20 mm"],
    [{ "incomingFilmShare.value": "140 %" }, "incomingFilmShare.value", "outside 0 to 100 %"],
    [
      { "incomingBowAlong.value": "", "incomingBowAlong.tolerance": "", "incomingBowAcross.value": "" },
      "incomingBowAlong.value",
      "the bow that this is a share of",
    ],
  ])("is refused with %j", (changes, at, words) => {
    expect(send(flowSchema, { ...FLOW, ...changes }).errors[at]?.join(" ")).toContain(words);
  });
});

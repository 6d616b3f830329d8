/*
 * The demo flows of the fixture, walked. Their figures were computed for this program by another implementation of the
 * same equations, copper history included: they are regression values, not validation.
 *
 *   bow      standard bow at 25 °C after the step, device side up, centre above the rim positive, m
 *
 * Tolerances are the fixture's own: 5 % or 5 µm for an unbonded wafer, 8 % or 10 µm for a bonded pair, whose adhesive is
 * modelled in more than one way; half a micrometre more, because it prints whole ones. Bows at peak above the softening point are
 * informative there and not compared.
 */
import { describe, expect, it } from "vitest";
import { walkFlow, type StepState } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import { DEMO_FLOWS, demoFlow } from "../../fixtures/demo-flow-input.ts";

const limits = defaultLimits();

/** Rounding of the printed figures, m. */
const PRINTED = 0.5e-6;

function difference(state: StepState, expectedMicrometres: number | null | undefined) {
  const { atRoom, after } = state;
  if (!atRoom || typeof expectedMicrometres !== "number") return null;
  const bow = standardBow(atRoom.sagitta);
  const expected = expectedMicrometres * 1e-6;
  const [share, least] = after.bonds.length > 0 ? [0.08, 10e-6] : [0.05, 5e-6];
  return { off: Math.abs(bow - expected), allowed: Math.max(share * Math.abs(expected), least) + PRINTED };
}

describe.each(DEMO_FLOWS)("%s", (name) => {
  const { flow, expected } = demoFlow(name);
  const walked = walkFlow(flow, limits).steps;
  const elastic = walkFlow(flow, limits, { metalHistory: false }).steps;
  const cases = walked.map((state, index) => ({
    number: state.number,
    title: state.step.title,
    state,
    elastic: elastic[index],
    wanted: expected[index],
  }));

  it.each(cases)("step $number, $title", ({ state, elastic: without, wanted }) => {
    expect(state.lies).toBe(wanted?.as_loaded ?? "held");
    const withHistory = difference(state, wanted?.bow25_um);
    if (withHistory) expect(withHistory.off).toBeLessThanOrEqual(withHistory.allowed);
    expect(withHistory === null).toBe(typeof wanted?.bow25_um !== "number");
    if (!without) throw new Error("both walks have the same steps");
    const withoutHistory = difference(without, wanted?.bow25_um_without_copper_history);
    if (withoutHistory) expect(withoutHistory.off).toBeLessThanOrEqual(withoutHistory.allowed);
  });

  it("would roll about one axis where the fixture says so, if nothing held it", () => {
    expect(walked.map(({ released }) => released.regime)).toEqual(
      expected.map(({ if_released_free }) => if_released_free.regime),
    );
  });
});

describe("Tern as it is written, the seed left under the lines", () => {
  const { flow, expected } = demoFlow("Tern", { asWritten: true });
  const walked = walkFlow(flow, limits).steps.slice(0, 7);

  it.each(walked.map((state, index) => ({ number: state.number, state, wanted: expected[index]?.bow25_um })))(
    "agrees at step $number",
    ({ state, wanted }) => {
      const found = difference(state, wanted);
      expect(found?.off).toBeLessThanOrEqual(found?.allowed ?? 0);
    },
  );
});

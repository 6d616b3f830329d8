/* The force of each film, and its share of what bends the wafer. */
import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { filmForces } from "#app/lib/film-forces.ts";
import { stackDraft } from "#app/lib/stack-draft.ts";
import { mirroredDeviceSide } from "#app/lib/stack-edit.ts";
import type { LayerText } from "#app/lib/stack-text.ts";
import { stackPanel } from "#app/services/estimate-answer.ts";
import { CHOICES, layerText, TEXT } from "./samples.ts";

function forcesOf(layers: LayerText[]) {
  const panel = stackPanel(stackDraft({ ...TEXT, layers }, CHOICES), null, defaultLimits());
  if (!panel) throw new Error("The sample is complete.");
  return filmForces(panel.room);
}

describe("film forces", () => {
  it("are stress times thickness times coverage, and add up to those of the sides", () => {
    const { films, front, back, net } = forcesOf(TEXT.layers);
    // From the silicon outwards: 200 MPa × 5 µm × 35 %, 30 MPa × 7 µm × 92 %, then 30 MPa × 2 µm on the back.
    expect(films.map(({ force }) => Number(force.toPrecision(9)))).toEqual([350, 193.2, 60]);
    expect(front).toBeCloseTo(543.2, 6);
    expect(back).toBeCloseTo(60, 6);
    expect(net).toBeCloseTo(483.2, 6);
    expect(films.map(({ bends }) => Math.sign(bends))).toEqual([1, 1, -1]);
    expect(films.reduce((sum, { share }) => sum + (share ?? 0), 0)).toBeCloseTo(1, 12);
  });

  it("balance in a mirrored stack, compression against compression too", () => {
    const layers = [layerText({ stress: { value: "-150 MPa" } }), layerText({})];
    const { net, films } = forcesOf(mirroredDeviceSide(layers));
    expect(Math.abs(net)).toBeLessThan(1e-9);
    expect(films.map(({ force }) => Math.sign(force))).toEqual([1, -1, 1, -1]);
  });

  it("have no share where nothing pulls", () => {
    expect(forcesOf([]).films).toEqual([]);
    expect(forcesOf([layerText({ stress: { value: "0 MPa" } })]).films).toMatchObject([{ force: 0, share: null }]);
  });
});

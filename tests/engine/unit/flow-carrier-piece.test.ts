import { describe, expect, it } from "vitest";
import { withBond } from "#app/engine/finder/with-bond.ts";
import { bondStep, carrier, debondStep, findings, flow, adhesive, step } from "./flow-samples.ts";

const piece = (overrides: Parameters<typeof carrier>[0] = {}) =>
  carrier({ identity: "K-12", uses: 3, useLimit: 5, ...overrides });
const onto = (made = piece()) => bondStep({}, adhesive(), made);
const uses = (input: Parameters<typeof findings>[0], at: number) =>
  findings(input, 7, { at }).filter(({ reason }) => /^Use |out of use/.test(reason));

describe("a piece of a carrier", () => {
  it.each([
    [3, "clear", "Use 4 of Silicon carrier, K-12; it stands 5."],
    [4, "caution", "Use 5 of Silicon carrier, K-12; it stands 5."],
    [5, "do not run", "Use 6 of Silicon carrier, K-12; it stands 5."],
  ])("used %i times before is %s", (before, outcome, reason) => {
    expect(uses(flow([onto(piece({ uses: before }))]), 1)).toMatchObject([{ outcome, reason }]);
  });

  it("that is bonded twice in a flow is used twice, and another piece is not", () => {
    const again = [onto(), debondStep({ planned: "bare" }), onto()];
    expect(uses(flow(again), 1)).toMatchObject([{ reason: expect.stringContaining("Use 4") as string }]);
    expect(uses(flow(again), 3)).toMatchObject([
      { outcome: "caution", reason: expect.stringContaining("Use 5") as string },
    ]);
    const other = [onto(), debondStep({ planned: "bare" }), onto(piece({ identity: "K-13" }))];
    expect(uses(flow(other), 3)).toMatchObject([{ reason: expect.stringContaining("Use 4") as string }]);
  });

  it("that is out of use is not to be bonded", () => {
    expect(uses(flow([onto(piece({ outOfUse: "scrapped" }))]), 1)).toMatchObject([
      { outcome: "do not run", reason: "Silicon carrier, K-12, is out of use: scrapped." },
    ]);
  });

  it("stays the piece that is named when another adhesive is tried, and goes with its carrier", () => {
    const input = flow([onto(), step({ planned: "carrier" })]);
    const tried = (of: ReturnType<typeof carrier>) =>
      withBond(
        input,
        { from: 1, to: 2, face: "front" },
        { carrier: of, material: adhesive({ id: "other" }), thickness: 3e-5 },
      ).steps[0]?.bond?.carrier.identity;
    expect(tried(carrier())).toBe("K-12");
    expect(tried(carrier({ id: "other" }))).toBeUndefined();
  });
});

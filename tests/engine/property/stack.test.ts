/* What must hold for any stack on a free wafer. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { estimateStack } from "#app/engine/stack/estimate-stack.ts";
import { withThickness, type StackFilm, type StackInput } from "#app/engine/stack/model.ts";
import { curlingThickness } from "#app/engine/stack/thickness-sweep.ts";
import { relative } from "../relative.ts";
import { between, logarithmic } from "./arbitraries.ts";

const film: fc.Arbitrary<StackFilm> = fc.record({
  side: fc.constantFrom("front", "back"),
  thickness: logarithmic(50e-9, 20e-6),
  stress: between(-500e6, 500e6),
  youngsModulus: logarithmic(2e9, 300e9),
  poissonsRatio: between(0, 0.4),
  expansion: between(0, 50e-6),
  coverage: between(0.05, 1),
});
const stacks: fc.Arbitrary<StackInput> = fc.record({
  wafer: fc.record({
    diameter: fc.constantFrom(0.1, 0.15, 0.2, 0.3),
    orientation: fc.constantFrom("100", "111"),
    thickness: logarithmic(20e-6, 775e-6),
  }),
  films: fc.array(film, { minLength: 1, maxLength: 6 }),
  temperature: between(250, 550),
});

const turned = (stack: StackInput): StackInput => ({
  ...stack,
  films: stack.films.map((each) => ({ ...each, side: each.side === "front" ? "back" : "front" })),
});

describe("a stack", () => {
  it("turned over bends the other way by as much", () => {
    fc.assert(
      fc.property(stacks, (stack) => {
        const [one, other] = [estimateStack(stack), estimateStack(turned(stack))];
        const scale = Math.max(Math.abs(one.laminate.curvature), 1e-6);
        expect(Math.abs(one.laminate.curvature + other.laminate.curvature)).toBeLessThan(1e-9 * scale);
        expect(Math.abs(one.stoney.curvature + other.stoney.curvature)).toBeLessThanOrEqual(
          1e-12 * Math.max(1, Math.abs(one.stoney.curvature)),
        );
        expect(other.shape.regime).toBe(one.shape.regime);
      }),
    );
  });

  it("with the same films on both sides stays flat", () => {
    fc.assert(
      fc.property(stacks, (stack) => {
        const front = stack.films.filter(({ side }) => side === "front");
        const back = front.map((each) => ({ ...each, side: "back" as const }));
        const { laminate, stoney } = estimateStack({ ...stack, films: [...front, ...back] });
        // Rounding of the strains, over a thickness of 20 µm at least.
        expect(Math.abs(laminate.curvature)).toBeLessThan(1e-10 / 20e-6);
        expect(Math.abs(stoney.curvature)).toBeLessThan(1e-9);
      }),
    );
  });

  it("does the same when a film is split in two", () => {
    fc.assert(
      fc.property(stacks, between(0.1, 0.9), (stack, share) => {
        const split = stack.films.flatMap((each) => [
          { ...each, thickness: each.thickness * share },
          { ...each, thickness: each.thickness * (1 - share) },
        ]);
        const [whole, parts] = [estimateStack(stack), estimateStack({ ...stack, films: split })];
        const scale = Math.max(Math.abs(whole.laminate.curvature), 1e-3);
        expect(Math.abs(whole.laminate.curvature - parts.laminate.curvature)).toBeLessThan(1e-8 * scale);
        expect(relative(parts.filmForce.front + 1, whole.filmForce.front + 1)).toBeLessThan(1e-9);
      }),
    );
  });

  it("rolls just below its curling limit and not above it", () => {
    fc.assert(
      fc.property(stacks, (stack) => {
        const limit = curlingThickness(stack, 2e-3);
        if (limit === null || limit === 2e-3) return;
        const regime = (thickness: number) => estimateStack(withThickness(stack, thickness)).shape.regime;
        expect(regime(limit * (1 - 1e-6))).toBe("curled");
        expect(regime(limit * (1 + 1e-6))).not.toBe("curled");
        expect(regime((limit * 2 + 2e-3) / 3)).not.toBe("curled");
      }),
      { numRuns: 60 },
    );
  });
});

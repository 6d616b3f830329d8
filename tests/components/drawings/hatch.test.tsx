import { describe, expect, it } from "vitest";
import { Hatch } from "#app/components/drawings/Hatch.tsx";
import { hatchPath } from "#app/components/drawings/hatch-path.ts";
import { HatchBox } from "#app/components/drawings/HatchBox.tsx";
import { HATCH_STYLES, OUTCOME_SIGNS, SUPPORT_SIGNS } from "#app/components/drawings/severity.ts";
import { attributes, render } from "./render.ts";

/** Feet of the rising lines along the lower edge. */
function feet(path: string): number[] {
  return [...path.matchAll(/M(-?[\d.]+) (?!0L)[\d.]+L/g)].map((match) => Number(match[1]));
}

describe("hatch", () => {
  it("rules lines at 45 degrees, a pitch apart measured across them", () => {
    const lines = feet(hatchPath(60, 30, 4.5, false));
    expect(lines.length).toBeGreaterThan(10);
    lines.slice(1).forEach((foot, index) => {
      expect((foot - (lines[index] ?? 0)) / Math.SQRT2).toBeCloseTo(4.5, 1);
    });
    expect(hatchPath(60, 30, 4.5, false)).toMatch(/^M-30 30L0 0M/);
  });

  it("covers the whole box", () => {
    const lines = feet(hatchPath(60, 30, 9, false));
    expect(Math.min(...lines)).toBeLessThanOrEqual(-30 + 9 * Math.SQRT2);
    expect(Math.max(...lines)).toBeGreaterThan(60 - 9 * Math.SQRT2);
  });

  it("adds the other diagonal only when crossed", () => {
    expect(hatchPath(20, 10, 5, true).length).toBeGreaterThan(1.8 * hatchPath(20, 10, 5, false).length);
  });

  it("grows denser with severity, and 'cannot judge' has a broken outline and a sparse cross-hatch of its own", () => {
    const pitch = (level: keyof typeof HATCH_STYLES) => HATCH_STYLES[level].pitch ?? Infinity;
    expect(pitch("clear")).toBe(Infinity);
    expect(pitch("gripper")).toBeGreaterThan(pitch("caution"));
    expect(pitch("caution")).toBe(9);
    expect(pitch("need")).toBe(4.5);
    expect(pitch("stop")).toBe(5);
    expect(HATCH_STYLES.stop.crossed).toBe(true);
    expect(HATCH_STYLES.unknown).toMatchObject({ crossed: true, dashedOutline: true });
    expect(pitch("unknown")).toBeGreaterThan(2 * pitch("stop"));
    expect(
      attributes(render(<HatchBox level="unknown" x={0} y={0} width={22} height={14} />), "stroke-dasharray"),
    ).toHaveLength(1);
    expect(
      attributes(render(<HatchBox level="stop" x={0} y={0} width={22} height={14} />), "stroke-dasharray"),
    ).toHaveLength(0);
  });

  it("gives no two outcomes and no two support classes the same ruling", () => {
    for (const signs of [Object.values(OUTCOME_SIGNS), Object.values(SUPPORT_SIGNS)]) {
      const rulings = signs.map(({ level }) => JSON.stringify({ ...HATCH_STYLES[level], colour: "" }));
      expect(new Set(rulings).size).toBe(signs.length);
    }
  });

  it("is drawn as lines in a clipping svg", () => {
    const markup = render(<Hatch level="need" x={3} y={4} width={60} height={30} />);
    expect(markup).toMatch(/^<svg x="3" y="4" width="60" height="30" overflow="hidden"/);
    expect(markup).not.toContain("<pattern");
    expect(render(<Hatch level="clear" x={0} y={0} width={60} height={30} />)).toBe("");
  });

  it("scales pitch and stroke together", () => {
    const markup = render(<Hatch level="caution" x={0} y={0} width={60} height={30} scale={1.3} />);
    expect(attributes(markup, "stroke-width").map(Number)[0]).toBeCloseTo(1.56, 6);
  });
});

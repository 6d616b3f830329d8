/*
 * What must hold for any patterned film.
 *
 *   f      area fraction covered               1
 *   σ      stress of the blanket film          Pa
 *   N      film force per width                N/m
 *   g      share of the stress kept across a line or in an island
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { edgeRelief } from "#app/engine/patterned/edge-relief.ts";
import { patternedFilm } from "#app/engine/patterned/patterned-film.ts";
import { relative } from "../relative.ts";
import { between, logarithmic } from "./arbitraries.ts";

const films = fc.record({
  stress: fc.oneof(between(1e6, 1e9), between(-1e9, -1e6)),
  thickness: logarithmic(10e-9, 50e-6),
  youngsModulus: logarithmic(1e9, 400e9),
  poissonsRatio: between(0, 0.45),
});
const coverage = between(0.01, 1);
const directions = between(-Math.PI, Math.PI);

describe("patternedFilm", () => {
  it("full and random patterns pull with coverage times the blanket force, both ways alike", () => {
    fc.assert(
      fc.property(films, coverage, (film, share) => {
        const blanket = film.stress * film.thickness;
        const full = patternedFilm({ ...film, pattern: { kind: "full" } }).force;
        const random = patternedFilm({ ...film, pattern: { kind: "random", coverage: share } }).force;
        expect(relative(full.x, blanket)).toBeLessThan(1e-13);
        expect(relative(full.y, blanket)).toBeLessThan(1e-13);
        expect(relative(random.x, share * blanket)).toBeLessThan(1e-13);
        expect(Math.abs(full.xy)).toBe(0);
      }),
    );
  });

  it("lines along x: N_x = f σ h (1 − ν (1 − g)), N_y = f g σ h, and islands f g σ h", () => {
    fc.assert(
      fc.property(films, coverage, logarithmic(1e-8, 1e-2), (film, share, width) => {
        const pattern = { kind: "lines" as const, coverage: share, lineWidth: width, direction: 0 };
        const { force, edgeRelief: g } = patternedFilm({ ...film, pattern });
        const blanket = share * film.stress * film.thickness;
        expect(relative(force.x, blanket * (1 - film.poissonsRatio * (1 - g)))).toBeLessThan(1e-12);
        expect(Math.abs(force.y - blanket * g)).toBeLessThanOrEqual(1e-12 * Math.abs(blanket));
        const islands = patternedFilm({ ...film, pattern: { kind: "islands", coverage: share, size: width } });
        expect(Math.abs(islands.force.x - blanket * islands.edgeRelief)).toBeLessThanOrEqual(1e-12 * Math.abs(blanket));
        expect(islands.edgeRelief).toBeLessThanOrEqual(g);
      }),
    );
  });

  it("lines turned by an angle turn their force as a tensor; its trace stays", () => {
    fc.assert(
      fc.property(films, coverage, logarithmic(1e-8, 1e-2), directions, (film, share, width, direction) => {
        const at = (angle: number) =>
          patternedFilm({
            ...film,
            pattern: { kind: "lines", coverage: share, lineWidth: width, direction: angle },
          }).force;
        const [own, turned] = [at(0), at(direction)];
        const [c, s] = [Math.cos(direction), Math.sin(direction)];
        const scale = 1e-12 * (Math.abs(own.x) + Math.abs(own.y));
        expect(Math.abs(turned.x - (c * c * own.x + s * s * own.y))).toBeLessThanOrEqual(scale);
        expect(Math.abs(turned.y - (s * s * own.x + c * c * own.y))).toBeLessThanOrEqual(scale);
        expect(Math.abs(turned.xy - c * s * (own.x - own.y))).toBeLessThanOrEqual(scale);
      }),
    );
  });

  it("lines along y are lines along x with the axes swapped, and no shear", () => {
    fc.assert(
      fc.property(films, coverage, logarithmic(1e-8, 1e-2), (film, share, width) => {
        const at = (direction: number) =>
          patternedFilm({ ...film, pattern: { kind: "lines", coverage: share, lineWidth: width, direction } }).force;
        const [x, y] = [at(0), at(Math.PI / 2)];
        expect(relative(y.y, x.x)).toBeLessThan(1e-14);
        expect(Math.abs(y.x - x.y)).toBeLessThanOrEqual(1e-14 * Math.abs(x.x));
        expect(Math.abs(y.xy)).toBe(0);
      }),
    );
  });
});

describe("edgeRelief", () => {
  it("rises from 0 to 1 with the width, smoothly across its series", () => {
    fc.assert(
      fc.property(logarithmic(1e-9, 1e3), between(1.001, 3), (width, factor) => {
        const [g, wider] = [edgeRelief(width, 1), edgeRelief(width * factor, 1)];
        expect(g).toBeGreaterThan(0);
        expect(wider).toBeGreaterThan(g);
        expect(wider).toBeLessThan(1);
        // a²/3 from below for narrow lines, 1 − 1/a for wide ones.
        const a = width / 2;
        expect(g).toBeLessThanOrEqual((a * a) / 3);
        expect(g).toBeGreaterThanOrEqual(1 - 1 / a);
      }),
    );
    const [below, above] = [edgeRelief(0.04 * (1 - 1e-12), 1), edgeRelief(0.04 * (1 + 1e-12), 1)];
    expect(relative(below, above)).toBeLessThan(1e-9);
  });
});

/*
 *   x, z   position and height   m
 *   κ      curvature             1/m
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fitProfile } from "#app/engine/profile/fit-profile.ts";
import { numberReader } from "#app/lib/scan-reading/numbers.ts";
import { profilePoints } from "#app/lib/scan-reading/profile-points.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import { PLAIN, scanFile, trueScan } from "#tests/fixtures/scan-files.ts";

const SEED = 20261201;

/** Styles of which some leave a doubt: under any of them a file is read as it is, or asked about. */
const style = fc
  .record({
    delimiter: fc.constantFrom(",", ";", "\t", "|", "  "),
    decimalComma: fc.boolean(),
    groups: fc.constantFrom("", ",", ".", " ", "'"),
    positionUnit: fc.constantFrom("mm", "µm", "inch", "mil", "cm"),
    heightUnit: fc.constantFrom("µm", "nm", "Å", "mil"),
    positionDecimals: fc.integer({ min: 0, max: 5 }),
    heightDecimals: fc.integer({ min: 0, max: 5 }),
    power: fc.constantFrom("", "", "E", "D"),
    counted: fc.boolean(),
    lineEnd: fc.constantFrom("\n", "\r\n", "\r"),
    encoding: fc.constantFrom("utf-8", "utf-16le with mark", "windows-1252"),
    headed: fc.constantFrom("in the heads", "in a row", "not"),
  } as const)
  .filter(({ delimiter, decimalComma, groups }) => {
    const mark = decimalComma ? "," : ".";
    return (
      groups !== mark &&
      (groups === "" || groups.trim() !== delimiter.trim()) &&
      !(delimiter.trim() === "" && groups === " ")
    );
  })
  .map(({ headed, ...given }) => {
    const cells = (...all: string[]) => [...(given.counted ? ["No"] : []), ...all].join(given.delimiter);
    const lines =
      headed === "not"
        ? []
        : headed === "in a row"
          ? [
              cells("Position", "Height"),
              [...(given.counted ? ["-"] : []), given.positionUnit, given.heightUnit].join(given.delimiter),
            ]
          : [cells(`Position [${given.positionUnit}]`, `Height [${given.heightUnit}]`)];
    const delimiterInNumbers = given.delimiter === "," && (given.decimalComma || given.groups === ",");
    return { ...given, quoted: delimiterInNumbers, lines };
  });

describe("whatever the style of a file", () => {
  it("what is read of it is what it holds, or it is asked about", () => {
    let [read, asked] = [0, 0];
    fc.assert(
      fc.property(
        style,
        fc.double({ min: 5e-3, max: 95e-3, noNaN: true }),
        fc.boolean(),
        (given, reach, descending) => {
          const scan = trueScan({ count: 40, from: -reach, to: 95e-3 });
          if (descending) scan.reverse();
          const file = scanFile(scan, { ...PLAIN, ...given });
          const found = readScanFile(file.bytes, "a.csv");
          if (found.outcome === "question") {
            asked += 1;
            return;
          }
          read += 1;
          if (found.content.kind !== "profiles") throw new Error(found.content.kind);
          expect(found.content.profiles).toHaveLength(1);
          const [profile] = found.content.profiles;
          scan.forEach(({ x, z }, n) => {
            expect(Math.abs((profile?.x[n] ?? NaN) - x)).toBeLessThanOrEqual(file.positionError);
            expect(Math.abs((profile?.z[n] ?? NaN) - z)).toBeLessThanOrEqual(file.heightError);
          });
        },
      ),
      { seed: SEED, numRuns: 1000 },
    );
    // Of a file that names its units little is left to ask.
    expect(read).toBeGreaterThan(asked);
  }, 60_000);
});

describe("numbers", () => {
  it("are those that the language itself reads, to the last bit", () => {
    const read = numberReader("point", "none");
    const comma = numberReader("comma", "none");
    fc.assert(
      fc.property(
        fc.double({ min: -1e300, max: 1e300, noNaN: true }),
        fc.integer({ min: 0, max: 12 }),
        (value, decimals) => {
          for (const text of [
            String(value),
            value.toFixed(Math.abs(value) < 1e20 ? decimals : 0),
            value.toExponential(decimals),
          ]) {
            expect(read(text)).toBe(Number(text));
            expect(comma(text.replace(".", ","))).toBe(Number(text));
          }
        },
      ),
      { seed: SEED, numRuns: 2000 },
    );
  }, 60_000);

  it.each(["", " ", ".", "-", "+-1", "1.2.3", "0x1F", "1e", "1_000", "Infinity", "1e999", "1 2", "12a", "NaN", "1,5"])(
    "'%s' is none with a decimal point",
    (text) => expect(numberReader("point", "none")(text)).toBeNaN(),
  );

  it.each(["1.5", "1,", "1, ", "1,e5", "1.234,5", ","])("'%s' is none with a decimal comma", (text) =>
    expect(numberReader("comma", "none")(text)).toBeNaN(),
  );

  it.each([
    ["1,234.5", "point", "comma", 1234.5],
    ["-12,345,678", "point", "comma", -12345678],
    ["1.234,5", "comma", "point", 1234.5],
    ["1 234,5", "comma", "blank", 1234.5],
    ["1'234.5", "point", "apostrophe", 1234.5],
    ["12,34", "point", "comma", NaN],
    ["1,2345", "point", "comma", NaN],
    ["12.5", "point", "comma", 12.5],
  ] as const)("'%s' with a decimal %s and thousands by %s", (text, mark, thousands, value) => {
    expect(numberReader(mark, thousands)(text)).toBe(value);
  });
});

describe("more points than are kept", () => {
  const arrays = (points: { x: number; z: number }[]) => ({
    x: Float64Array.from(points, ({ x }) => x),
    z: Float64Array.from(points, ({ z }) => z),
    from: Math.min(...points.map(({ x }) => x)),
    to: Math.max(...points.map(({ x }) => x)),
  });
  // Sines of numbers that share no period with the scan stand for noise of 50 nm.
  const scan = trueScan({ count: 60_000 }).map(({ x, z }, n) => ({ x, z: z + 70e-9 * Math.sin(12.9898 * n * n) }));

  it("become means that show the curvature that all of them have, in any order", () => {
    const all = fitProfile(scan, { edgeExclusion: 5e-3 });
    for (const points of [scan, [...scan].reverse()]) {
      const means = profilePoints(arrays(points), 5000);
      expect(means).toHaveLength(5000);
      const fit = fitProfile(means, { edgeExclusion: 5e-3 });
      expect(Math.abs(fit.curvature - all.curvature)).toBeLessThan(0.1 * all.standardUncertainty);
    }
  });

  it("few points stay as they are", () => {
    const few = trueScan();
    expect(profilePoints(arrays(few))).toEqual(few);
  });
});

import fc from "fast-check";
import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";
import { csvNumber, csvOf } from "#app/lib/csv.ts";

const one = (cell: string | number) => csvOf([[cell]]).trimEnd();

describe("a cell", () => {
  it.each([
    ["=1+1", "'=1+1"],
    ["@a", "'@a"],
    ["-x", "'-x"],
    ["+1", "'+1"],
    ["\tx", "'\tx"],
    ["plain", "plain"],
    ['a "b"', '"a ""b"""'],
    ["a,b", '"a,b"'],
  ])("turns %j into %j", (text, cell) => expect(one(text)).toBe(cell));

  it("spares numbers, negative ones too", () => {
    expect(one(-12.5)).toBe("-12.5");
    expect(csvOf([[-12.5, "-12,5"]], "comma")).toBe("-12,5;'-12,5\r\n");
  });

  it("quotes what parts the columns, and only that", () => {
    expect(csvOf([["a,b", "a;b", 1.5]], "point")).toBe('"a,b",a;b,1.5\r\n');
    expect(csvOf([["a,b", "a;b", 1.5]], "comma")).toBe('a,b;"a;b";1,5\r\n');
  });
});

describe("a number with a comma", () => {
  it.each([
    [1.5, "1,5"],
    [-0.25, "-0,25"],
    [1.234, "1,2340"],
    [-12.345, "-12,3450"],
    [0.123, "0,123"],
    [1234.567, "1234,567"],
    [1.234e-9, "1,2340e-9"],
    [1e-7, "1e-7"],
    [1e21, "1e+21"],
    [200, "200"],
  ])("writes %d as %s", (value, text) => expect(csvNumber(value, "comma")).toBe(text));

  it("is read back as itself and as nothing else", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e12, max: 1e12 }), (value) => {
        const read = parseQuantity(csvNumber(value, "comma"), "number");
        expect(read.ok && read.value).toBe(value === 0 ? 0 : value);
      }),
    );
  });
});

it("comes back from a table whatever its mark", () => {
  const text = fc.string({ minLength: 1, unit: fc.constantFrom(..."ab ,;\"'\n=-5.") });
  fc.assert(
    fc.property(fc.array(text, { minLength: 2, maxLength: 4 }), fc.constantFrom("point", "comma"), (cells, mark) => {
      const delimiter = mark === "comma" ? ";" : ",";
      const { data } = Papa.parse<string[]>(csvOf([cells], mark), { delimiter, newline: "\r\n", skipEmptyLines: true });
      expect(data[0]).toEqual(cells.map((cell) => (/^[=+\-@]/.test(cell) ? `'${cell}` : cell)));
    }),
  );
});

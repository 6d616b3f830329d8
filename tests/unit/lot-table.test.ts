import { describe, expect, test } from "vitest";
import { readLotTable } from "#app/lib/lot-table.ts";

describe("a table of lots", () => {
  test("is one lot by its name, wafers as slot and name, either of which may be missing", () => {
    expect(readLotTable("1, W01\n2\n,W09\n", "T-0420")).toEqual({
      lots: [
        {
          name: "T-0420",
          wafers: [
            { slot: 1, name: "W01" },
            { slot: 2, name: "slot 2" },
            { slot: null, name: "W09" },
          ],
        },
      ],
      faults: [],
    });
    expect(readLotTable("", "T-0420").lots).toEqual([{ name: "T-0420", wafers: [] }]);
  });

  test("is several lots under heads in any order, whatever sets its columns apart", () => {
    const { lots, faults } = readLotTable("\uFEFFWafer;Lot;Slot\r\nW01;T-1;1\r\nW02;t-1;2\r\nW01;T-2;1\r\n", "");
    expect(faults).toEqual([]);
    expect(lots.map(({ name, wafers }) => [name, wafers.length])).toEqual([
      ["T-1", 2],
      ["T-2", 1],
    ]);
  });

  test("says what is wrong, row by row", () => {
    expect(readLotTable("lot,slot\nT-1,26\n,3\nT-1,4\nT-1,4\n", "").faults).toEqual([
      "Row 2: ‘26’ is no slot from 1 to 25.",
      "Row 3: it names no lot.",
      "Row 5: slot 4 stands there twice.",
    ]);
    expect(readLotTable("", "").faults).toEqual(["Name the lot, or give a table with the head lot."]);
    expect(readLotTable("1,W01\n2,w01", "T").faults).toEqual(["Row 2: wafer w01 stands there twice."]);
  });
});

import { describe, expect, it } from "vitest";
import { readWafers } from "#app/lib/lot-wafers.ts";
import { RULES } from "#app/schemas/ranges.ts";

const read = (text: string) => readWafers(text, { bow: RULES.bow.range, thickness: RULES.siliconThickness.range });
const um = (micrometres: number) => expect.closeTo(micrometres / 1e6, 12) as number;

describe("a list of wafers", () => {
  it.each([
    ["commas", "1,-176,724.8\n2,-183.5,725.3"],
    ["a heading", "slot, bow, thickness\n1, -176, 724.8\n2, -183.5, 725.3\n"],
    ["a heading with units", "Slot;Bow (µm);Thickness (µm)\n1;-176;724,8\n2;-183,5;725,3"],
    ["semicolons and decimal commas", "1;-176;724,8\r\n2;-183,5;725,3\r\n"],
    ["tabs, as a spreadsheet pastes", "1\t-176\t724.8\t\n2\t-183.5\t725.3\t\n\n"],
    ["units", "2, -0.1835 mm, 0.7253 mm\n1, −176 µm, 724.8 um"],
  ])("is read with %s, by slot", (_, text) => {
    expect(read(text)).toEqual({
      wafers: [
        { slot: 1, bow: um(-176), thickness: um(724.8) },
        { slot: 2, bow: um(-183.5), thickness: um(725.3) },
      ],
      faults: [],
    });
  });

  it("may leave the thickness out, of all wafers", () => {
    expect(read("1,-176\n2,-183").wafers).toMatchObject([{ thickness: null }, { thickness: null }]);
    expect(read("1,-176,725\n2,-183").faults).toEqual(["Row 2: the thickness is missing; blank is missing, not zero."]);
  });

  it.each([
    ["1,12 parsecs,725", /^Row 1: bow: .*parsecs/],
    ["1,,725", /^Row 1: the bow is missing/],
    ["1,-176,-725", /^Row 1: thickness: .*outside 1 µm to 2 mm/],
    ["0,-176,725", /^Row 1: “0” is no slot from 1 to 25/],
    ["26,-176,725", /no slot/],
    ["1,-176,725\n1,-180,725", /^Row 2: slot 1 stands in row 1 already/],
    ["1,-176,5,725,0", /semicolons/],
    ["slot,bow,thickness", /no row of figures/],
    ["1;NaN;725", /^Row 1: bow/],
  ])("is told the row that cannot be read: %s", (text, sentence) => {
    const { faults } = read(text);
    expect(faults).toHaveLength(1);
    expect(faults[0]).toMatch(sentence);
  });

  it("has as many wafers as a cassette", () => {
    const rows = Array.from({ length: 26 }, (_, index) => `${index + 1},-100,725`);
    expect(read(rows.slice(0, 25).join("\n")).wafers).toHaveLength(25);
    expect(read(rows.join("\n")).faults).toEqual(["There are 26 rows; a lot has up to 25 wafers."]);
  });
});

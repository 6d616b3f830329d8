/* Two people have changed one stack: who changed what. */
import { describe, expect, it } from "vitest";
import { conflictRows } from "#app/lib/stack-conflict.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import { CHOICES, layerText, TEXT } from "./samples.ts";

const silicon = (value: string): StackText => ({ ...TEXT, siliconThickness: { ...TEXT.siliconThickness, value } });
const rows = (mine: StackText, theirs: StackText, opened: StackText | null = TEXT) =>
  conflictRows({ mine, theirs, opened }, CHOICES);

describe("a conflict", () => {
  it("puts first what both have changed, and shows what it was", () => {
    const mine = { ...silicon("170 µm"), note: "mine" };
    const theirs = { ...silicon("180 µm"), name: "theirs" };
    expect(rows(mine, theirs)).toMatchObject([
      { label: "Remaining silicon", by: "both", opened: "250 µm", mine: "170 µm", theirs: "180 µm" },
      { label: "Name", by: "them", mine: TEXT.name, theirs: "theirs" },
      { label: "Note", by: "you", mine: "mine", theirs: "blank" },
    ]);
  });

  it("is none where both did the same", () => {
    expect(rows(silicon("170 µm"), silicon("170 µm"))).toEqual([]);
    expect(rows(TEXT, TEXT)).toEqual([]);
  });

  it("meets in a film although each has added another", () => {
    const thicker = TEXT.layers.map((layer, index) =>
      index === 1 ? { ...layer, thickness: { value: "6 um" } } : layer,
    );
    const mine = { ...TEXT, layers: [layerText({ thickness: { value: "1 µm" } }), ...thicker] };
    const theirs = { ...TEXT, layers: [...TEXT.layers, layerText({ side: "back" as const })] };
    expect(rows(mine, theirs).map(({ by }) => by)).toEqual(["them", "you", "you", "you"]);
  });

  it("without knowing what it was holds the two against each other", () => {
    expect(rows(silicon("170 µm"), silicon("180 µm"), null)).toEqual([
      { label: "Remaining silicon", opened: null, mine: "170 µm", theirs: "180 µm", by: "both" },
    ]);
  });
});

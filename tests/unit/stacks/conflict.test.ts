/* Two people have changed one stack, and what it was before is not known. */
import { expect, it } from "vitest";
import { conflictRows } from "#app/lib/stack-conflict.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import { CHOICES, TEXT } from "./samples.ts";

const silicon = (value: string): StackText => ({ ...TEXT, siliconThickness: { ...TEXT.siliconThickness, value } });

it("holds the two against each other", () => {
  expect(conflictRows(silicon("170 µm"), silicon("180 µm"), CHOICES)).toEqual([
    { label: "Remaining silicon", mine: "170 µm", theirs: "180 µm" },
  ]);
});

it("is none where both did the same", () => {
  expect(conflictRows(silicon("170 µm"), silicon("170 µm"), CHOICES)).toEqual([]);
});

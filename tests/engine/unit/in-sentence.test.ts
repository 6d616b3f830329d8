import { expect, test } from "vitest";
import { inSentence } from "#app/engine/in-sentence.ts";

test.each([
  ["Edge trimmer", "edge trimmer"],
  ["Edges up 12 µm.", "edges up 12 µm."],
  ["CMP tool", "CMP tool"],
  ["X2 coater", "X2 coater"],
  ["Änderung", "änderung"],
  ["spin coater", "spin coater"],
  ["", ""],
])("%s within a sentence is %s", (text, within) => {
  expect(inSentence(text)).toBe(within);
});

import { describe, expect, it } from "vitest";
import { tickedWords } from "#app/lib/ticked-words.ts";

const STACKS = ["stack", "stacks"] as const;
const COMPARE = { label: "Compare", to: "/stacks/compare", least: 2, most: 6 };
const REMOVE = { label: "Remove", to: "/stacks/remove" };

describe("what the bar says of what is ticked", () => {
  it("says that nothing is ticked, and asks for nothing then", () => {
    expect(tickedWords(0, STACKS, [COMPARE, REMOVE])).toBe("No stack ticked.");
  });

  it("counts", () => {
    expect(tickedWords(1, STACKS, [REMOVE])).toBe("1 stack ticked.");
    expect(tickedWords(3, STACKS, [COMPARE, REMOVE])).toBe("3 stacks ticked.");
  });

  it("says of which action it is too few or too many, and by how many", () => {
    expect(tickedWords(1, STACKS, [COMPARE, REMOVE])).toBe("1 stack ticked. Compare: tick one more.");
    expect(tickedWords(6, STACKS, [COMPARE])).toBe("6 stacks ticked.");
    expect(tickedWords(8, STACKS, [COMPARE])).toBe("8 stacks ticked. Compare: at most six, untick two.");
  });
});

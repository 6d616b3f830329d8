import { describe, expect, it } from "vitest";
import { align, alignSteps } from "#app/lib/align.ts";

const letters = (before: string, after: string) =>
  align([...before], [...after], [(letter) => letter]).map((pair) => `${pair.before ?? "."}${pair.after ?? "."}`);

const step = (kind: string, title = kind) => ({ kind, title });
const titles = (pairs: ReturnType<typeof alignSteps>) =>
  pairs.map(({ before, after }) => [before?.title ?? null, after?.title ?? null]);

describe("two lists aligned", () => {
  it.each([
    ["", "", []],
    ["abc", "abc", ["aa", "bb", "cc"]],
    ["abc", "", ["a.", "b.", "c."]],
    ["ac", "abc", ["aa", ".b", "cc"]],
    ["abcd", "acxd", ["aa", "b.", "cc", ".x", "dd"]],
    ["aab", "ab", ["aa", "a.", "bb"]],
  ])("'%s' and '%s'", (before, after, pairs) => {
    expect(letters(before, after)).toEqual(pairs);
  });

  it("keeps every item once and in order, however long", () => {
    const before = Array.from({ length: 300 }, (_, n) => `${n % 7}`);
    const after = Array.from({ length: 300 }, (_, n) => `${n % 5}`);
    const pairs = align(before, after, [(item) => item]);
    expect(pairs.flatMap((pair) => pair.before ?? [])).toEqual(before);
    expect(pairs.flatMap((pair) => pair.after ?? [])).toEqual(after);
  });
});

describe("two flows aligned", () => {
  it("by kind and title, a renamed step between two that stayed by its kind", () => {
    expect(
      titles(
        alignSteps(
          [step("receive"), step("cure", "Cure at 230"), step("grind")],
          [step("receive"), step("cure", "Cure at 200"), step("grind")],
        ),
      ),
    ).toEqual([
      ["receive", "receive"],
      ["Cure at 230", "Cure at 200"],
      ["grind", "grind"],
    ]);
  });

  it("a step of another kind in its place is one gone and one new", () => {
    expect(titles(alignSteps([step("plate")], [step("deposit")]))).toEqual([
      ["plate", null],
      [null, "deposit"],
    ]);
  });
});

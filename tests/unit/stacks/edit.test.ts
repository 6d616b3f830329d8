/* What is done to the films of a stack as a whole. */
import { describe, expect, it } from "vitest";
import type { Side } from "#app/engine/vocabulary.ts";
import { copyPlace, crossed, mirroredDeviceSide, mirrorPlace, moved } from "#app/lib/stack-edit.ts";

interface Film {
  side: Side;
  name: string;
}
const films = (text: string): Film[] =>
  text
    .split(" ")
    .flatMap((word) => (word === "" ? [] : [{ side: word.startsWith("b") ? "back" : "front", name: word }]));
/** The names, those of films that changed sides with the new side before them. */
const names = (list: readonly Film[]) => list.map(({ side, name }) => `${side.charAt(0)}:${name}`).join(" ");

/** Three on the device side, f3 next to the silicon, and two on the back, b1 next to it. */
const STACK = films("f1 f2 f3 b1 b2");

describe("a copy", () => {
  it("goes on its film, away from the silicon", () => {
    expect([0, 2, 3, 4].map((index) => copyPlace(STACK, index))).toEqual([0, 2, 4, 5]);
  });
});

describe("a mirrored film", () => {
  it("goes as far from the silicon on the other side, or on top of what is there", () => {
    // f3 lies on the silicon, f2 over one film, f1 over two.
    expect([2, 1, 0].map((index) => mirrorPlace(STACK, index))).toEqual([3, 4, 5]);
    expect([3, 4].map((index) => mirrorPlace(STACK, index))).toEqual([3, 2]);
    expect(mirrorPlace(films("f1"), 0)).toBe(1);
    expect(mirrorPlace(films("b1 b2 b3"), 2)).toBe(0);
  });

  it("of the whole device side takes the place of the back, reversed", () => {
    expect(names(mirroredDeviceSide(STACK))).toBe("f:f1 f:f2 f:f3 b:f3 b:f2 b:f1");
    expect(mirroredDeviceSide(films("b1"))).toEqual([]);
    const twice = mirroredDeviceSide(mirroredDeviceSide(STACK));
    expect(twice).toEqual(mirroredDeviceSide(STACK));
  });
});

describe("a film that changes sides", () => {
  it("keeps its distance from the silicon where it can", () => {
    const first = crossed(STACK, 0);
    expect([names(first.films), first.index]).toEqual(["f:f2 f:f3 b:b1 b:b2 b:f1", 4]);
    const inner = crossed(STACK, 3);
    expect([names(inner.films), inner.index]).toEqual(["f:f1 f:f2 f:f3 f:b1 b:b2", 3]);
  });

  it("comes back to where it was, unless it had more under it than the other side has films", () => {
    for (const index of [1, 2, 3, 4]) {
      const there = crossed(STACK, index);
      const back = crossed(there.films, there.index);
      expect(names(back.films)).toBe(names(STACK));
      expect(back.index).toBe(index);
    }
  });
});

describe("a film that is dragged", () => {
  const to = (from: number, before: number, side: Side) => {
    const { films: list, index } = moved(STACK, from, { before, side });
    return [names(list), index];
  };
  it("goes before the film that it is let go over", () => {
    expect(to(0, 2, "front")).toEqual(["f:f2 f:f1 f:f3 b:b1 b:b2", 1]);
    expect(to(2, 0, "front")).toEqual(["f:f3 f:f1 f:f2 b:b1 b:b2", 0]);
    expect(to(3, 5, "back")).toEqual(["f:f1 f:f2 f:f3 b:b2 b:b1", 4]);
  });

  it("through the silicon comes to lie on the other side", () => {
    expect(to(2, 3, "back")).toEqual(["f:f1 f:f2 b:f3 b:b1 b:b2", 2]);
    expect(to(3, 3, "front")).toEqual(["f:f1 f:f2 f:f3 f:b1 b:b2", 3]);
    expect(to(4, 0, "front")).toEqual(["f:b2 f:f1 f:f2 f:f3 b:b1", 0]);
  });

  it("stays where it is let go on itself", () => {
    expect(to(1, 1, "front")).toEqual([names(STACK), 1]);
    expect(to(1, 2, "front")).toEqual([names(STACK), 1]);
  });
});

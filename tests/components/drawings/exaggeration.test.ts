import { describe, expect, it } from "vitest";
import { chooseExaggeration, EXAGGERATIONS } from "#app/components/drawings/choose-exaggeration.ts";
import { setAsideExaggeration } from "#app/components/drawings/set-aside-exaggeration.ts";

const D = 0.3;

describe("exaggeration of a page", () => {
  it("is the largest of the series that keeps the largest bow within 0.45 of the width", () => {
    expect(chooseExaggeration([14e-6, -867e-6, 313e-6], D)).toBe(150);
    expect(chooseExaggeration([574e-6, 34e-6], D)).toBe(200);
    expect(chooseExaggeration([-2900e-6], D)).toBe(20);
  });

  it("takes the limit itself and steps down just beyond it", () => {
    const atLimit = (0.45 * D) / 100;
    expect(chooseExaggeration([atLimit * (1 - 1e-9)], D)).toBe(100);
    expect(chooseExaggeration([atLimit * 1.001], D)).toBe(50);
  });

  it("never goes below 1 nor beyond the series", () => {
    expect(chooseExaggeration([0.2], D)).toBe(1);
    expect(chooseExaggeration([0], D)).toBe(1000);
    expect(chooseExaggeration([], D)).toBe(EXAGGERATIONS.at(-1));
  });

  it("does not depend on the sign", () => {
    expect(chooseExaggeration([-343e-6], D)).toBe(chooseExaggeration([343e-6], D));
  });
});

describe("bows set aside", () => {
  it("takes a bow above four times the median out of the choice and gives it its own scale", () => {
    const { common, own } = setAsideExaggeration([34e-6, 289e-6, 313e-6, 6756e-6], D);
    expect(common).toBe(400);
    expect(own).toEqual([null, null, null, 15]);
  });

  it("leaves a page without a far bow as it is", () => {
    const bows = [140e-6, 217e-6, 343e-6];
    expect(setAsideExaggeration(bows, D)).toEqual({ common: chooseExaggeration(bows, D), own: [null, null, null] });
  });

  it("sets nothing aside where the common scale would serve anyway", () => {
    expect(setAsideExaggeration([1e-6, 1e-6, 10e-6], D).own).toEqual([null, null, null]);
  });
});

/* Requests of the API: what is refused and where, and that every way to an answer ends in the same digits. */
import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { estimateStack } from "#app/engine/stack/estimate-stack.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { stackDraft } from "#app/lib/stack-draft.ts";
import { panelKey, panelRequests } from "#app/lib/stack-panel.ts";
import { stackText } from "#app/lib/stack-text.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import { EstimateRefused } from "#app/lib/estimate-answer.ts";
import { answerEstimate, answerOrNull, stackPanel } from "#app/services/estimate-answer.ts";
import { readEstimateRequest } from "#app/services/estimate-request.ts";
import { CHOICES, TEXT } from "./samples.ts";

const FILM = {
  side: "front" as const,
  thickness_m: 10e-6,
  stress_Pa: 100e6,
  youngs_modulus_Pa: 117e9,
  poissons_ratio: 0.34,
};
const WAFER = { diameter_m: 0.3, thickness_m: 100e-6, orientation: "100" as const };
const GOOD: EstimateRequest = { wafer: WAFER, films: [FILM] };
const limits = defaultLimits();

const pointersOf = (work: () => unknown): string[] => {
  try {
    work();
  } catch (error) {
    if (error instanceof EstimateRefused) return error.faults.map(({ pointer }) => pointer);
    throw error;
  }
  return [];
};
const refused = (body: unknown) => pointersOf(() => readEstimateRequest(body));

describe("a request", () => {
  it.each<[string, unknown, string[]]>([
    ["no object", [], [""]],
    ["null", null, [""]],
    ["empty", {}, ["/wafer", "/films"]],
    ["unknown keys", { ...GOOD, extra: 1 }, ["/extra"]],
    ["a key with signs of a pointer", { ...GOOD, wafer: { ...WAFER, "a/b~c": 1 } }, ["/wafer/a~1b~0c"]],
    ["an unknown key of a film", { ...GOOD, films: [FILM, { ...FILM, sress_Pa: 1 }] }, ["/films/1/sress_Pa"]],
    ["a number as text", { ...GOOD, wafer: { ...WAFER, diameter_m: "0.3" } }, ["/wafer/diameter_m"]],
    ["null for a number", { ...GOOD, temperature_K: null }, ["/temperature_K"]],
    ["infinity", { ...GOOD, temperature_K: Infinity }, ["/temperature_K"]],
    ["a negative thickness", { ...GOOD, wafer: { ...WAFER, thickness_m: -1e-4 } }, ["/wafer/thickness_m"]],
    ["orientation 110", { ...GOOD, wafer: { ...WAFER, orientation: "110" } }, ["/wafer/orientation"]],
    [
      "a tolerance as large as the silicon",
      { ...GOOD, wafer: { ...WAFER, thickness_tolerance_m: 100e-6 } },
      ["/wafer/thickness_tolerance_m"],
    ],
    [
      "a tolerance as large as a film",
      { ...GOOD, films: [{ ...FILM, thickness_tolerance_m: 10e-6 }] },
      ["/films/0/thickness_tolerance_m"],
    ],
    [
      "a negative tolerance",
      { ...GOOD, films: [{ ...FILM, stress_tolerance_Pa: -1 }] },
      ["/films/0/stress_tolerance_Pa"],
    ],
    ["a missing stress", { ...GOOD, films: [{ ...FILM, stress_Pa: undefined }] }, ["/films/0/stress_Pa"]],
    ["films that are no list", { ...GOOD, films: {} }, ["/films"]],
    ["too many films", { ...GOOD, films: Array.from({ length: 61 }, () => FILM) }, ["/films"]],
    ["a sweep upside down", { ...GOOD, sweep: { from_m: 2e-4, to_m: 1e-4, points: 9 } }, ["/sweep/to_m"]],
    ["a broken number of points", { ...GOOD, sweep: { from_m: 1e-4, to_m: 2e-4, points: 2.5 } }, ["/sweep/points"]],
  ])("with %s is refused there", (_, body, pointers) => {
    expect(refused(body)).toEqual(pointers);
  });

  it("within its ranges is taken as it is", () => {
    const whole: EstimateRequest = {
      wafer: { ...WAFER, thickness_tolerance_m: 0 },
      films: [{ ...FILM, cte_per_K: 16e-6, reference_temperature_K: 300, coverage: 0.4 }],
      temperature_K: 500,
      sweep: { from_m: 1e-6, to_m: 2e-3, points: 500 },
      working: true,
    };
    expect(readEstimateRequest(JSON.parse(JSON.stringify(whole)))).toEqual(whole);
  });
});

describe("what the engine cannot take", () => {
  const engine = (request: EstimateRequest) => pointersOf(() => answerEstimate(request, limits));

  it("points at the film whose expansion is missing, whichever side it is on", () => {
    const withCte = { ...FILM, cte_per_K: 16e-6 };
    expect(engine({ ...GOOD, temperature_K: 400 })).toEqual(["/films/0/cte_per_K"]);
    const films = [withCte, { ...withCte, side: "back" as const }, { ...FILM, side: "back" as const }, withCte];
    expect(engine({ ...GOOD, films, temperature_K: 400 })).toEqual(["/films/2/cte_per_K"]);
    expect(engine({ ...GOOD, films: [withCte, { ...FILM, reference_temperature_K: 350 }] })).toEqual([
      "/films/1/cte_per_K",
    ]);
  });

  it("points at the films when they make no plate together", () => {
    const films = Array.from({ length: 60 }, () => ({ ...FILM, thickness_m: 1e-3 }));
    expect(engine({ wafer: { ...WAFER, diameter_m: 0.05 }, films })).toEqual(["/films"]);
    expect(answerOrNull({ wafer: { ...WAFER, diameter_m: 0.05 }, films }, limits)).toBeNull();
  });
});

describe("an answer", () => {
  it("has standard bows: a tensile film on the device side gives a negative one", () => {
    const { stoney, laminate, shape } = answerEstimate({ ...GOOD, wafer: { ...WAFER, thickness_m: 775e-6 } }, limits);
    expect([stoney.bow_m < 0, laminate.bow_m < 0, shape.bow_m < 0]).toEqual([true, true, true]);
    const back = answerEstimate({ wafer: WAFER, films: [{ ...FILM, side: "back" }] }, limits);
    expect(back.shape.bow_m).toBeGreaterThan(0);
  });

  it("has a roll radius when curled, none otherwise, and no number that is missing", () => {
    const curled = answerEstimate(GOOD, limits);
    expect(curled.shape.regime).toBe("curled");
    expect(curled.shape.roll_radius_m).toBeGreaterThan(0);
    expect(Math.abs(curled.shape.bow_m)).toBeCloseTo(curled.shape.warp_m, 4);
    const flat = answerEstimate({ wafer: WAFER, films: [] }, limits);
    expect(flat.shape).toEqual({
      regime: "linear",
      bow_m: 0,
      across: null,
      warp_m: 0,
      roll_radius_m: null,
      stability_ratio: 0,
      warp_standard_uncertainty_m: null,
      warp_linear: null,
    });
    expect(flat.curls_below_m).toBeNull();
    expect(JSON.stringify(flat)).not.toContain("-0");
  });

  it("brings curve and working only when they are asked for", () => {
    expect(Object.keys(answerEstimate(GOOD, limits))).toEqual([
      "engine_version",
      "stoney",
      "laminate",
      "shape",
      "support",
      "film_force",
      "curls_below_m",
    ]);
    const more = answerEstimate({ ...GOOD, sweep: { from_m: 5e-5, to_m: 1e-4, points: 3 }, working: true }, limits);
    expect(more.sweep).toHaveLength(3);
    expect(more.sweep?.at(-1)?.warp_m).toBe(more.shape.warp_m);
    expect(more.working?.film_forces).toHaveLength(1);
    expect(more.engine_version).toBe(ENGINE_VERSION);
  });

  it("judges support by the site's own limits", () => {
    const wafer = { ...WAFER, thickness_m: 460e-6 };
    expect(answerEstimate({ wafer, films: [] }, limits).support.class).toBe("bare");
    const stricter = { ...limits, bareFrom300: { value: 500e-6, source: "site" } };
    expect(answerEstimate({ wafer, films: [] }, stricter).support.class).toBe("thin-wafer gripper");
    const large = answerEstimate({ wafer: { ...wafer, diameter_m: 0.45 }, films: [] }, limits);
    expect(large.support).toEqual({ class: null, because: "no thickness limits are set for a wafer this large" });
  });
});

describe("screen, API and engine", () => {
  const draft = stackDraft(stackText(TEXT), CHOICES);

  it.each([null, 473.15])("agree to the last digit at %s K", (temperature) => {
    const panel = stackPanel(draft, temperature, limits);
    const asked = panelRequests(draft, temperature);
    if (!panel || !asked) throw new Error("The sample is complete.");
    const overTheWire = (body: unknown) =>
      answerEstimate(readEstimateRequest(JSON.parse(JSON.stringify(body))), limits);
    expect(overTheWire(asked.room)).toEqual(panel.room.answer);
    if (asked.hot) expect(overTheWire(asked.hot)).toEqual(panel.hot?.answer);
    expect(panelKey({ room: panel.room.request, hot: panel.hot?.request ?? null })).toBe(panelKey(asked));
  });

  it("agree on every figure of the engine itself", () => {
    const panel = stackPanel(draft, null, limits);
    const estimate = estimateStack({
      wafer: { diameter: 0.2, orientation: "100", thickness: 250e-6, thicknessTolerance: 3e-6 },
      films: [
        { side: "front", thickness: 5e-6, stress: 200e6, youngsModulus: 117e9, poissonsRatio: 0.34, coverage: 0.35 },
        { side: "front", thickness: 7e-6, stress: 30e6, youngsModulus: 3e9, poissonsRatio: 0.35, coverage: 0.92 },
        { side: "back", thickness: 2e-6, stress: 30e6, youngsModulus: 3e9, poissonsRatio: 0.35 },
      ],
    });
    expect(panel?.room.answer).toMatchObject({
      stoney: { bow_m: standardBow(estimate.stoney.sagitta) },
      laminate: { bow_m: standardBow(estimate.laminate.sagitta) },
      shape: { bow_m: standardBow(estimate.shape.bowMajor), warp_m: estimate.shape.warp },
      film_force: { front_N_per_m: estimate.filmForce.front, back_N_per_m: estimate.filmForce.back },
    });
  });

  it("wait together while something is missing", () => {
    const incomplete = stackDraft({ ...TEXT, silicon: "" }, CHOICES);
    expect(panelRequests(incomplete, null)).toBeNull();
    expect(stackPanel(incomplete, null, limits)).toBeNull();
  });
});

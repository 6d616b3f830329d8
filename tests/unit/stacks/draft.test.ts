/* A stack read from its form's text. */
import { describe, expect, it } from "vitest";
import { panelRequest, stackDraft } from "#app/lib/stack-draft.ts";
import { turnFront } from "#app/lib/stack-order.ts";
import { newLayer, newStackText, saysTheSame, stackText, textOfStack } from "#app/lib/stack-text.ts";
import { CHOICES, COPPER, layerText, POLYMER, TEXT, WAFER } from "./samples.ts";

const withSilicon = (siliconThickness: (typeof TEXT)["siliconThickness"]) => ({ ...TEXT, siliconThickness });
const withLayer = (changes: Parameters<typeof layerText>[0]) => ({ ...TEXT, layers: [layerText(changes)] });

describe("a complete draft", () => {
  const draft = stackDraft(TEXT, CHOICES);

  it("asks in SI, films of the device side from the silicon outwards, its own stress before the film's", () => {
    expect(draft.faults).toEqual([]);
    expect(draft.request).toEqual({
      wafer: { diameter_m: 0.2, thickness_m: 250e-6, thickness_tolerance_m: 3e-6, orientation: "100" },
      films: [
        {
          side: "front",
          thickness_m: 5e-6,
          stress_Pa: 200e6,
          youngs_modulus_Pa: 117e9,
          poissons_ratio: 0.34,
          cte_per_K: 16.7e-6,
          coverage: 0.35,
        },
        {
          side: "front",
          thickness_m: 7e-6,
          stress_Pa: 30e6,
          youngs_modulus_Pa: 3e9,
          poissons_ratio: 0.35,
          cte_per_K: 42e-6,
          coverage: 0.92,
          stress_tolerance_Pa: 3e6,
        },
        {
          side: "back",
          thickness_m: 2e-6,
          stress_Pa: 30e6,
          youngs_modulus_Pa: 3e9,
          poissons_ratio: 0.35,
          cte_per_K: 42e-6,
          coverage: 1,
          stress_tolerance_Pa: 3e6,
        },
      ],
    });
  });

  it("keeps where values come from, and takes what nobody says for assumed", () => {
    expect(draft.thicknessSource).toBe("supplier");
    expect(draft.layers.map(({ stress, thicknessSource }) => [stress?.source, thicknessSource])).toEqual([
      ["assumed", "assumed"],
      ["measured here", "measured here"],
      ["assumed", "supplier"],
    ]);
  });

  it("leaves the tolerance out when none is given", () => {
    const { request } = stackDraft(withSilicon({ value: "250 µm" }), CHOICES);
    expect(request?.wafer).not.toHaveProperty("thickness_tolerance_m");
  });
});

describe("what is missing or cannot be read", () => {
  it.each([
    ["blank silicon", { ...TEXT, silicon: "" }, "silicon", "Choose the silicon."],
    ["unknown silicon", { ...TEXT, silicon: COPPER.id }, "silicon", "Choose the silicon."],
    ["blank thickness", withSilicon({}), "siliconThickness.value", "Type the silicon thickness. Blank is missing"],
    ["parsecs", withSilicon({ value: "12 parsecs" }), "siliconThickness.value", "parsecs is not a unit of length"],
    ["no unit", withSilicon({ value: "100" }), "siliconThickness.value", "100 what?"],
    ["negative", withSilicon({ value: "-5 µm" }), "siliconThickness.value", "−5 µm is outside 1 µm to 2 mm."],
    ["zero", withSilicon({ value: "0 µm" }), "siliconThickness.value", "0 µm is outside"],
    [
      "tolerance as large as the silicon",
      withSilicon({ value: "100 µm", tolerance: "100 µm" }),
      "siliconThickness.tolerance",
      "as large as the silicon itself",
    ],
    ["no film", withLayer({ film: "" }), "layers[0].film", "Choose a film."],
    ["blank film thickness", withLayer({ thickness: {} }), "layers[0].thickness.value", "Type the film thickness."],
    ["thick film", withLayer({ thickness: { value: "3 mm" } }), "layers[0].thickness.value", "outside 1 nm to 1 mm"],
    ["blank coverage", withLayer({ coverage: "" }), "layers[0].coverage", "Type the area coverage."],
    ["coverage over one", withLayer({ coverage: "120 %" }), "layers[0].coverage", "outside 0.01 % to 100 %"],
    ["stress of length", withLayer({ stress: { value: "3 µm" } }), "layers[0].stress.value", "unit of length"],
  ])("%s is a fault at its field", (_, text, field, message) => {
    const { request, faults } = stackDraft(text, CHOICES);
    expect(request).toBeNull();
    expect(faults.map((fault) => fault.field)).toContain(field);
    const said = faults.find((fault) => fault.field === field)?.message.replaceAll("\u00A0", " ");
    expect(said).toContain(message);
  });

  it("of a new film is named by its place, the film first", () => {
    const { faults } = stackDraft({ ...TEXT, layers: [newLayer("front"), ...TEXT.layers] }, CHOICES);
    expect(faults.map(({ what }) => what)).toEqual(["film 1 from the top", "thickness of film 1 from the top"]);
  });

  it("of an empty form is everything that it needs", () => {
    const { faults, layers } = stackDraft(newStackText(""), CHOICES);
    expect(faults.map(({ field }) => field)).toEqual(["silicon", "siliconThickness.value"]);
    expect(layers).toEqual([]);
  });
});

describe("what is unusual", () => {
  const remarksOf = (text: typeof TEXT) => stackDraft(text, CHOICES).layers[0]?.remarks ?? [];

  it.each([
    ["1500 MPa", 0],
    ["1501 MPa", 1],
    ["-2000 MPa", 0],
    ["-2001 MPa", 1],
  ])("of a stress of %s gives %i remarks and does not block", (value, count) => {
    const text = withLayer({ stress: { value } });
    expect(remarksOf(text)).toHaveLength(count);
    expect(stackDraft(text, CHOICES).request).not.toBeNull();
  });

  it("of a film is more than a tenth of the silicon", () => {
    expect(remarksOf(withLayer({ thickness: { value: "25 µm" } }))).toEqual([]);
    expect(remarksOf(withLayer({ thickness: { value: "25.1 µm" } })).join()).toContain("Stoney");
  });

  it("of the silicon is more than it was bought with", () => {
    expect(stackDraft(withSilicon({ value: "725 µm" }), CHOICES).remarks).toEqual([]);
    expect(stackDraft(withSilicon({ value: "726 µm" }), CHOICES).remarks).toHaveLength(1);
  });
});

describe("panelRequest", () => {
  const { request } = stackDraft(TEXT, CHOICES);
  if (!request) throw new Error("The sample is complete.");

  it("asks for the curve from 20 µm to the wafer as bought, and for the working at 25 °C only", () => {
    const room = panelRequest(request, { boughtThickness: WAFER.thickness, temperature: null });
    expect([room.sweep?.from_m, room.sweep?.to_m, room.working]).toEqual([20e-6, 725e-6, true]);
    expect(room).not.toHaveProperty("temperature_K");
    const hot = panelRequest(request, { boughtThickness: WAFER.thickness, temperature: 500 });
    expect([hot.temperature_K, hot.working]).toEqual([500, undefined]);
  });

  it.each([
    [1e-6, 1e-6, 725e-6],
    [12e-6, 6e-6, 725e-6],
    [900e-6, 20e-6, 900e-6],
  ])("reaches around %f m", (thickness_m, from, to) => {
    const asked = { ...request, wafer: { ...request.wafer, thickness_m } };
    const { sweep } = panelRequest(asked, { boughtThickness: 725e-6, temperature: null });
    expect([sweep?.from_m, sweep?.to_m]).toEqual([from, to]);
  });
});

describe("the text of a form", () => {
  it("turns the device side over and back again", () => {
    const films = [
      { side: "front" as const, name: "inner" },
      { side: "front" as const, name: "outer" },
      { side: "back" as const, name: "first" },
      { side: "back" as const, name: "second" },
    ];
    const drawn = turnFront(films);
    expect(drawn.map(({ name }) => name)).toEqual(["outer", "inner", "first", "second"]);
    expect(turnFront(drawn)).toEqual(films);
  });

  it("of a stored stack reads back as the same values", () => {
    const measured = (value: number) => ({ value, tolerance: null, source: "supplier" as const });
    const text = textOfStack({
      ...TEXT,
      program: { id: TEXT.program },
      silicon: WAFER,
      siliconThickness: { ...measured(123.456e-6), tolerance: 2.5e-6 },
      layers: [
        {
          side: "front",
          filmId: COPPER.id,
          thickness: measured(0.1 + 0.2 - 0.2999),
          ownStress: measured(-123.4e6),
          coverage: 0.123,
          lines: { width: 10e-6, direction: Math.PI / 2 },
        },
        { side: "front", filmId: POLYMER.id, thickness: measured(3.3e-6), ownStress: null, coverage: 1, lines: null },
      ],
    });
    const draft = stackDraft(text, CHOICES);
    expect(draft.thickness).toBeCloseTo(123.456e-6, 15);
    expect(draft.tolerance).toBeCloseTo(2.5e-6, 17);
    expect(draft.layers.map(({ film }) => film?.id)).toEqual([POLYMER.id, COPPER.id]);
    expect(draft.layers[1]?.thickness).toBeCloseTo(0.0001, 12);
    expect(draft.layers[1]?.stress?.value).toBeCloseTo(-123.4e6, 3);
    expect(draft.layers[1]?.cut?.coverage).toBeCloseTo(0.123, 12);
    expect(draft.layers[1]?.cut?.lines?.width).toBeCloseTo(10e-6, 15);
    expect(draft.layers[1]?.cut?.lines?.direction).toBeCloseTo(Math.PI / 2, 10);
    expect(draft.layers[0]?.cut).toEqual({ coverage: 1, lines: null });
  });

  it("says the same whatever else the form sends, and however it breaks its lines", () => {
    const sent = { ...TEXT, note: "one\r\ntwo", version: "3", at: "245 C" };
    expect(saysTheSame(sent, { ...TEXT, note: "one\ntwo" })).toBe(true);
    expect(saysTheSame(sent, { ...TEXT, note: "one" })).toBe(false);
    expect(saysTheSame({ ...TEXT, layers: undefined }, { ...TEXT, layers: [] })).toBe(true);
  });

  it("survives any payload", () => {
    for (const payload of [null, undefined, "x", 3, { layers: "x", siliconThickness: [] }, { layers: [null] }])
      expect(stackDraft(stackText(payload), CHOICES).request).toBeNull();
  });
});

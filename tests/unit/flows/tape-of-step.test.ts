import { describe, expect, it } from "vitest";
import type { TapeInput } from "#app/engine/flow/handling-inputs.ts";
import type { Measured } from "#app/engine/measured.ts";
import { BLANK_HANDLING } from "#app/lib/blank-step.ts";
import { tapeOf } from "#app/lib/flow-handling.ts";
import { stepHandlingWords } from "#app/lib/step-handling-words.ts";
import { stepSchema } from "#app/schemas/flow.ts";
import { tapeSchema } from "#app/schemas/tape.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";

const stated = (value: number): Measured => ({ value, tolerance: null, source: "supplier" });
const LIBRARY: TapeInput & { id: string } = {
  id: "11111111-1111-4111-8111-111111111111",
  name: "Dicing tape A",
  temperatureLimit: stated(353.15),
  embeddingDepth: null,
  thicknessVariation: stated(3e-6),
  longestTime: null,
  releasesInLight: true,
  resistances: { vacuum: { word: "resists", longest: 1800 }, solvent: { word: "attacked" } },
};
const said = (own: Partial<StepHandlingValues>): StepHandlingValues => ({ ...BLANK_HANDLING, ...own });

describe("the tape of a step", () => {
  it("is none where neither the library nor the step says anything of it", () => {
    expect(tapeOf(said({}), null)).toBeNull();
  });

  it("is that of the library, whole, where the step states nothing", () => {
    expect(tapeOf(said({}), LIBRARY)).toEqual(LIBRARY);
  });

  it("is what the step states where it chose none", () => {
    expect(tapeOf(said({ tapeSolvent: "resists" }), null)).toEqual({
      name: "the tape",
      resistances: { solvent: { word: "resists" } },
    });
  });

  it("takes what the step states before the library's, property by property", () => {
    const own = said({ tapeTemperatureLimit: stated(363.15), tapeReleasesInLight: false, tapeSolvent: "resists" });
    expect(tapeOf(own, LIBRARY)).toEqual({
      ...LIBRARY,
      temperatureLimit: stated(363.15),
      releasesInLight: false,
      resistances: { vacuum: { word: "resists", longest: 1800 }, solvent: { word: "resists" } },
    });
    expect(tapeOf(said({ tapeName: "Blue one" }), LIBRARY)?.name).toBe("Blue one");
  });

  it("says what stands in place of what", () => {
    const own = said({ tapeTemperatureLimit: stated(363.15), tapeReleasesInLight: true });
    const words = new Map(
      stepHandlingWords(own, LIBRARY).map(([label, text]) => [label, text?.replaceAll("\u00A0", " ") ?? null]),
    );
    expect(words.get("Tape")).toBe("Dicing tape A, of the library");
    expect(words.get("Highest temperature of the tape")).toBe("90 °C, stated here in place of 80 °C of the library");
    expect(words.get("Ultraviolet light lets the tape go")).toBe("yes");
    expect(words.get("Tape in vacuum")).toBe("resists, of the library");
    expect(words.get("Tape in acid")).toBeNull();
  });
});

describe("a tape in forms", () => {
  it("belongs to a step that puts the wafer on tape, and to no other", () => {
    const step = (kind: string) =>
      stepSchema.safeParse({ title: "One", kind, peakTemperature: "25 °C", planned: "film frame", tape: LIBRARY.id });
    expect(step("mount on frame").data?.tape).toBe(LIBRARY.id);
    expect(step("dice").error?.issues.map(({ path, message }) => [path.join("."), message])).toEqual([
      ["tape", "Only a step that puts it on tape has it: leave it blank."],
    ]);
  });

  it("needs no more than a name and a purpose; the rest is missing, never no", () => {
    const read = tapeSchema.parse({ name: "One", kind: "dicing tape", handling: { attackedBy: [] } });
    expect(read).toMatchObject({ temperatureLimit: null, longestTime: null, handlingSource: "assumed" });
    expect(read.handling).toMatchObject({ vacuum: null, releasesInLight: null });
  });

  it.each([
    [{ kind: "masking tape" }, "kind"],
    [{ thickness: { value: "12 parsecs", source: "supplier" } }, "thickness.value"],
    [{ thickness: { value: "100 um", tolerance: "100 um", source: "supplier" } }, "thickness.tolerance"],
    [{ temperatureLimit: { value: "-400 °C", source: "supplier" } }, "temperatureLimit.value"],
    [{ longestTime: { value: "7 d" } }, "longestTime.source"],
    [{ handling: { attackedBy: [], vacuum: { word: "", longest: "30 min" } } }, "handling.vacuum.word"],
  ])("%j is refused at %s", (typed, field) => {
    const { error } = tapeSchema.safeParse({
      name: "One",
      kind: "dicing tape",
      handling: { attackedBy: [] },
      ...typed,
    });
    expect(error?.issues.map(({ path }) => path.join("."))).toContain(field);
  });
});

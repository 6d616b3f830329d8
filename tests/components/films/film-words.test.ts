import { describe, expect, it } from "vitest";
import { filmAnswer, filmHistory, measuredOn } from "#app/components/films/film-words.ts";
import { BLANK_FILM_HANDLING } from "#app/lib/blank-handling.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";

/** Stress in Pa, tension positive. */
const stated = (value: number, tolerance: number | null = null) => ({ value, tolerance, source: "supplier" as const });
const plain = (text: string) => text.replaceAll("\u00A0", " ");

const COPPER: LibraryRecords["film"] = {
  id: "f",
  name: "Plated copper",
  kind: "metal",
  note: "",
  stressState: "as plated",
  stress: stated(20e6, 3e6),
  youngsModulus: stated(117e9),
  poissonsRatio: stated(0.34),
  expansion: stated(16.7e-6),
  yieldStress: stated(200e6),
  zeroStressTemperature: null,
  temperatureLimit: null,
  handling: BLANK_FILM_HANDLING,
};

describe("the words of a film", () => {
  it("give the sense of its pull and the shape that it makes on the device side", () => {
    expect(plain(filmAnswer(COPPER))).toBe(
      "In tension at 25 °C, +20.0 ± 3.0 MPa: on the device side it pulls the wafer to a bowl, edges up.",
    );
    expect(plain(filmAnswer({ ...COPPER, stress: stated(-150e6) }))).toBe(
      "In compression at 25 °C, −150 MPa: on the device side it pushes the wafer to a dome, edges down.",
    );
    expect(filmAnswer({ ...COPPER, stress: stated(0, 10e6) })).toContain("Without stress");
  });

  it("say whether heat leaves it with another stress", () => {
    expect(plain(filmHistory(COPPER))).toContain("It yields at 200 MPa");
    expect(filmHistory({ ...COPPER, yieldStress: null })).toContain("elastic");
    expect(filmHistory({ ...COPPER, kind: "polymer", yieldStress: null })).toContain("down to zero");
  });
});

describe("what a stress was measured on", () => {
  it("says what is given and no more", () => {
    expect(measuredOn(BLANK_FILM_HANDLING)).toBe("not given");
    expect(plain(measuredOn({ ...BLANK_FILM_HANDLING, stressState: "as deposited", stressFilmThickness: 5e-6 }))).toBe(
      "5 µm, as deposited",
    );
    expect(plain(measuredOn({ ...BLANK_FILM_HANDLING, monitorThickness: 725e-6, monitorDiameter: 0.2 }))).toBe(
      "on 725 µm silicon, a wafer of 200 mm",
    );
  });
});

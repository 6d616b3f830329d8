/** Times in s, temperatures in K; what is typed is in minutes and °C. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { PROFILE_EXAMPLE, profileText, profileWords, readProfile } from "#app/lib/temperature-profile.ts";

const points = (...list: [minutes: number, degrees: number][]) =>
  list.map(([minutes, degrees]) => ({ time: minutes * 60, temperature: degrees + 273.15 }));

const read = (typed: string) => {
  const found = readProfile(typed);
  return found.ok ? found.profile : found.message;
};

describe("a profile as it is typed", () => {
  it.each([
    ["on one line", PROFILE_EXAMPLE],
    ["one point a line", PROFILE_EXAMPLE.replaceAll("; ", "\r\n")],
    ["with units", "0 min 25 °C; 0.5 h 150 C; 60min 150°C; 90 min, 230 degC; 2 h 298.15 K"],
    ["with a comma and a blank, a colon or a slash between", "0, 25; 30: 150; 60/150; 90 , 230; 120 25;"],
  ])("is read %s", (_name, typed) => {
    const wanted = points([0, 25], [30, 150], [60, 150], [90, 230], [120, 25]);
    const found = read(typed);
    expect(Array.isArray(found)).toBe(true);
    (found as typeof wanted).forEach(({ time, temperature }, at) => {
      expect(time).toBe(wanted[at]?.time);
      expect(temperature).toBeCloseTo(wanted[at]?.temperature ?? NaN, 9);
    });
  });

  it("takes decimals by point or comma, and temperatures below zero", () => {
    expect(read("0 -40; 0,5 25.5")).toEqual([
      { time: 0, temperature: expect.closeTo(233.15, 9) as number },
      { time: 30, temperature: expect.closeTo(298.65, 9) as number },
    ]);
  });

  it("is nothing when it is blank", () => {
    expect(read("")).toBeNull();
    expect(read(" ;\n ")).toBeNull();
  });

  it.each([
    ["0 25; 30,150; 60 25", "Point 2: “30,150” is one number with decimals or two: type minutes, a blank and °C."],
    ["0 25; 30; 60 25", "Point 2: “30” has one number only: type minutes, a blank and °C."],
    ["0 25 30 150", "Point 1: “0 25 30 150” has 4 numbers where minutes and °C belong."],
    ["0 25; 1 200 150", "Point 2: “1 200 150” has 3 numbers"],
    ["0 25; 1,234 150", "Point 2: “1,234 min” can be read as 1234 or as 1.234"],
    ["0 25; 30 12 parsecs", "Point 2: "],
    ["0 25; 30 hot", "Point 2: “30 hot” has one number only"],
    ["0 25; 150 °C 30 min", "Point 2: "],
    ["5 25; 30 150", "Point 1 is at 5 min: begin at 0"],
    ["0 25; 30 150; 30 200", "Point 3 is at 30 min, not after point 2 at 30 min. Minutes come first, then °C."],
    ["0 25; 60 150; 30 200", "Point 3 is at 30 min, not after point 2 at 60 min."],
    ["0 25; 30 2000", "Point 2: 2000 °C is outside"],
    ["0 25; 30 -300", "Point 2: "],
    ["0 25", "One point alone is no profile."],
    ["0 25; 99999999 30", "Point 2: 99999999 min is outside"],
    [Array.from({ length: 41 }, (_, n) => `${n} 25`).join(";"), "41 points; a profile takes at most 40."],
  ])("is refused by name and place: %s", (typed, message) => {
    const found = read(typed);
    expect(typeof found === "string" ? found.replaceAll("\u00a0", " ") : found).toContain(message);
  });

  it("reads back what it is written as", () => {
    const some = fc
      .array(fc.tuple(fc.integer({ min: 1, max: 5000 }), fc.integer({ min: -1200, max: 11_000 })), {
        minLength: 2,
        maxLength: 20,
      })
      .map((list) => {
        let tenths = 0;
        return list.map(([more, degrees], at) => {
          tenths += at === 0 ? 0 : more;
          return [tenths / 10, degrees / 10] as [number, number];
        });
      });
    fc.assert(
      fc.property(some, (list) => {
        const profile = points(...list);
        const again = read(profileText(profile));
        expect(Array.isArray(again)).toBe(true);
        (again as typeof profile).forEach(({ time, temperature }, at) => {
          expect(time).toBeCloseTo(profile[at]?.time ?? NaN, 6);
          expect(temperature).toBeCloseTo(profile[at]?.temperature ?? NaN, 8);
        });
      }),
    );
    expect(profileText(null)).toBe("");
    expect(profileText(points([0, 25], [30, 150]))).toBe("0 25; 30 150");
  });

  it("is said in a sentence", () => {
    expect(profileWords(points([0, 25], [30, 150], [60, 150], [90, 230], [120, 25])).replaceAll("\u00a0", " ")).toBe(
      "25 °C, in 30 min to 150 °C, 30 min there, in 30 min to 230 °C, in 30 min to 25 °C; 120 min in all.",
    );
  });
});

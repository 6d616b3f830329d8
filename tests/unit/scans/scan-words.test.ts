import { describe, expect, it } from "vitest";
import { attachment } from "#app/lib/content-disposition.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { fileSize } from "#app/lib/file-size.ts";
import { bowWord, scanAnswer, senseOf } from "#app/lib/scan-answer.ts";
import { scanRemarks } from "#app/lib/scan-remarks.ts";
import type { ScanParameters, ScanResult } from "#app/schemas/scan-result.ts";
import { MONITOR_PARAMETERS } from "#app/db/seeders/demo-monitor.ts";

const plain = (text: string) => text.replaceAll("\u00A0", " ");

const READING = { rows: 381, used: 381, columns: 2, heading: null, delimiter: ",", from: -0.095, to: 0.095 };
const RESULT: ScanResult = {
  biaxialModulus: 180.2e9,
  curvatureBefore: 0,
  curvatureAfter: 0.0098,
  curvatureChange: 0.0098,
  curvatureUncertainty: 4e-6,
  bowChange: -49e-6,
  bowUncertainty: 0.02e-6,
  curled: null,
  understatedBy: 0.0015,
  stress: 31.2e6,
  stressUncertainty: 0.7e6,
  budget: [
    { input: "curvature change", contribution: 1e4, given: true },
    { input: "biaxial modulus", contribution: 3e5, given: true },
    { input: "silicon thickness", contribution: 1e5, given: true },
    { input: "film thickness", contribution: 2e5, given: true },
  ],
  rms: 8e-8,
  quartic: 0.002,
  steep: false,
  from: -0.095,
  to: 0.095,
  used: 361,
  rejected: 0,
  rejectedAt: [],
  before: { ...READING, skipped: [], skippedInAll: 0 },
  after: { ...READING, skipped: [], skippedInAll: 0 },
  curve: [],
};
const FILM = { name: "Polymer dielectric A", stress: 30e6, stressTolerance: 3e6, source: "measured here" as const };

describe("the answer", () => {
  const answer = (result: Partial<ScanResult>, film: typeof FILM | null = FILM) =>
    scanAnswer("M-0388", film, { ...RESULT, ...result }).map(plain);

  it("measured and used, with their intervals", () => {
    expect(answer({})).toEqual([
      "Polymer dielectric A: 31.2 ± 1.4 MPa, tension.",
      "The library uses 30.0 ± 3.0 MPa: the two agree.",
    ]);
  });

  it("agree up to the root sum of squares of the two intervals, and not beyond", () => {
    const together = Math.hypot(1.4e6, 3e6);
    expect(answer({ stress: 30e6 + together * 0.999 })[1]).toContain("the two agree");
    expect(answer({ stress: 30e6 + together * 1.001 })[1]).toContain("this scan lies 3.3 MPa further towards tension");
    expect(answer({ stress: 30e6 - together * 1.001 })[1]).toContain(
      "this scan lies 3.3 MPa further towards compression",
    );
  });

  it("says when the library's value is assumed", () => {
    const assumed = { ...FILM, stressTolerance: null, source: "assumed" as const };
    expect(scanAnswer("M-0388", assumed, RESULT).map(plain)[1]).toBe(
      "The library uses 30 MPa, assumed: the two agree.",
    );
  });

  it("is that there is no stress, once the wafer has rolled up", () => {
    expect(answer({ curled: { rollRadius: 0.3, edgeLift: 0.01 } })).toEqual([
      "Polymer dielectric A: the wafer has rolled up, so these scans give no film stress.",
    ]);
  });

  it("names the wafer where no film was named", () => {
    expect(answer({}, null)[0]).toBe("M-0388: 31.2 ± 1.4 MPa, tension.");
  });

  it.each([
    [31e6, "tension"],
    [-31e6, "compression"],
    [1.4e6, "not told from zero"],
    [-1.3e6, "not told from zero"],
    [0, "not told from zero"],
  ])("%s Pa is %s", (stress, word) => expect(senseOf({ ...RESULT, stress })).toBe(word));

  it.each([
    [-49e-6, "centre low, device side up"],
    [49e-6, "centre high, device side up"],
    [1e-8, "flat within its uncertainty"],
  ])("a bow of %s m is %s", (bow, word) => expect(bowWord(bow, 2e-8)).toBe(word));
});

describe("remarks", () => {
  const remarks = (result: Partial<ScanResult> = {}, parameters: Partial<ScanParameters> = {}) =>
    scanRemarks({ ...MONITOR_PARAMETERS, ...parameters }, { ...RESULT, ...result }).map(
      ({ level, text }) => `${level}: ${plain(text)}`,
    );

  it("none for a good scan", () => expect(remarks()).toEqual([]));

  it.each<[what: string, result: Partial<ScanResult>, parameters: Partial<ScanParameters>, says: RegExp]>([
    ["quartic beyond 5 %", { quartic: -0.0501 }, {}, /^caution: .*not spherical: 5 % of it is of fourth order/],
    [
      "silicon below 300 µm",
      {},
      { siliconThickness: 299e-6, filmThickness: 1e-7 },
      /^caution: Silicon below 300 µm: a stylus/,
    ],
    ["an understated stress", { understatedBy: 0.027 }, {}, /^caution: .*understated by about 2\.7 %/],
    ["a thick film", {}, { filmThickness: 13e-6 }, /^caution: The film is thick .* about 5\.4 % off/],
    ["a stress within its uncertainty", { stress: 1.4e6 }, {}, /^caution: .*cannot tell it from zero/],
    ["a short scan", { from: -0.05, to: 0.05 }, {}, /^note: Both scans cover 100 mm of the 200 mm wafer/],
    ["steepness", { steep: true }, {}, /^note: The scan is steeper than 0\.03/],
    [
      "points left out",
      { rejected: 2, rejectedAt: [-0.0301, 0.0125] },
      {},
      /^note: The fit left out 2 points .* at −30\.1, 12\.5 mm\.$/,
    ],
    ["many left out", { rejected: 30, rejectedAt: [0.01] }, {}, /30 points .* at 10\.0 mm and elsewhere\.$/],
    [
      "one tolerance missing",
      { budget: RESULT.budget.map((share) => ({ ...share, given: share.input !== "film thickness" })) },
      {},
      /^caution: No tolerance was given for the film thickness: the ± is too small by what it would add/,
    ],
  ])("%s", (_, result, parameters, says) => {
    const found = remarks(result, parameters);
    expect(found).toHaveLength(1);
    expect(found[0]).toMatch(says);
  });

  it.each([
    [300e-6, 0],
    [299e-6, 1],
    [100e-6, 1],
    [99e-6, 2],
  ])("silicon of %s m brings %i under a thin film", (siliconThickness, count) => {
    expect(remarks({}, { siliconThickness, filmThickness: 1e-7 })).toHaveLength(count);
  });

  it("says in words that about 100 µm is where the standards begin", () => {
    expect(remarks({}, { siliconThickness: 80e-6, filmThickness: 1e-7 })[1]).toMatch(
      /below about 100 µm is outside the scope of the standards for bow and warp, SEMI MF534 and MF1390/,
    );
  });

  it("a wafer that has rolled: neither stress nor bow, and nothing about how good they are", () => {
    const rolled = { curled: { rollRadius: 0.3, edgeLift: 0.01 }, understatedBy: null, quartic: 0.2, stress: 0 };
    const found = remarks({ ...rolled, from: 0, to: 0.05, rejected: 1, rejectedAt: [0] }, { siliconThickness: 80e-6 });
    expect(found[0]).toMatch(/^caution: .*rolled about one axis.*Neither a stress nor a bow is given/);
    expect(found.slice(1).map((text) => text.slice(0, 30))).toEqual([
      "caution: Silicon below 300 µm:",
      "caution: Silicon below about 1",
      "note: The fit left out 1 point",
    ]);
  });
});

describe("small texts", () => {
  it.each([
    [1, "1 byte"],
    [812, "812 bytes"],
    [1024, "1.0 kB"],
    [1024 * 1024 - 1, "1.0 MB"],
    [8 * 1024 * 1024, "8.0 MB"],
  ])("%i bytes are %s", (bytes, text) => expect(plain(fileSize(bytes))).toBe(text));

  it("an excerpt cuts no character in half and keeps no control character", () => {
    expect(excerpt("a\u0000b\tc", 10)).toBe("a b c");
    expect(excerpt("😀😀😀😀", 3)).toBe("😀😀…");
  });

  it.each([
    ["scan 1.csv", `attachment; filename="scan 1.csv"; filename*=UTF-8''scan%201.csv`],
    ['a"b\r\nX: y.csv', `attachment; filename="a_b__X_ y.csv"; filename*=UTF-8''a%22b%0D%0AX%3A%20y.csv`],
    ["Höhe (µm)'*.csv", `attachment; filename="H_he __m___.csv"; filename*=UTF-8''H%C3%B6he%20%28%C2%B5m%29%27%2A.csv`],
  ])("%j is saved under its name", (name, header) => expect(attachment(name)).toBe(header));
});

import { describe, expect, it } from "vitest";
import { importProfileOf } from "#app/lib/scan-reading/import-profile-of.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import { importProfileSchema, type ImportProfile } from "#app/schemas/import-profile.ts";
import { encoded, PLAIN, scanFile, scanText, trueScan } from "#tests/fixtures/scan-files.ts";
import { profilesOf, refusalOf } from "./read.ts";

const rows = (row: (n: number) => string, count = 12) => Array.from({ length: count }, (_, n) => row(n)).join("\n");
const read = (text: string, profile: ImportProfile) =>
  profilesOf(readScanFile(encoded(text, "utf-8"), "M-0388.csv", profile)).content.profiles;

describe("an import profile", () => {
  it("made of one reading reads the next file of the instrument, through the schema", () => {
    const file = scanFile(trueScan(), {
      delimiter: ";",
      decimalComma: true,
      counted: true,
      lines: ["No;Position [mm];Höhe [µm]"],
    });
    const { reading, content } = profilesOf(readScanFile(file.bytes, "a.csv"));
    const profile = importProfileSchema.parse(JSON.parse(JSON.stringify(importProfileOf(reading))));
    const again = profilesOf(readScanFile(file.bytes, "b.csv", profile));
    expect(again.content).toEqual(content);
  });

  it.each<[what: string, text: string, profile: ImportProfile, says: string]>([
    [
      "another decimal mark",
      scanText([trueScan()], { ...PLAIN, delimiter: ";", decimalComma: true, lines: ["x (mm);z (µm)"] }),
      { decimalMark: "point" },
      "M-0388.csv has two columns of numbers only with a decimal comma: row 2 holds “-95,000;",
    ],
    [
      "another delimiter",
      scanText([trueScan()], PLAIN),
      { delimiter: "\t" },
      "M-0388.csv has no row of numbers when it is split at “",
    ],
    [
      "a delimiter that the file names otherwise",
      `sep=;\n${scanText([trueScan()], { ...PLAIN, delimiter: ";" })}`,
      { delimiter: "," },
      "row 1: “sep=;” says that “;” stands between the columns; by the import profile it is “,”.",
    ],
    [
      "another unit in the head",
      scanText([trueScan()], { ...PLAIN, lines: ["# stylus", "x (mm),z (nm)"] }),
      { units: { position: "mm", height: "µm" } },
      "row 2: the height column is headed “z (nm)”, in nm, but µm is chosen. Choose nm, or the file that is in µm.",
    ],
    [
      "another unit in the row of units",
      scanText([trueScan()], { ...PLAIN, lines: ["x,z", "µm,µm"] }),
      { units: { position: "mm", height: "µm" } },
      "row 2: the position column is headed “µm”, in µm, but mm is chosen.",
    ],
    [
      "a unit that is not read",
      scanText([trueScan()], { ...PLAIN, lines: ["x (mm),z (pm)"] }),
      {},
      "row 1: the height column is in pm, which is not read here.",
    ],
    [
      "fewer columns",
      scanText([trueScan()], PLAIN),
      {
        columns: [
          { index: 0, role: "position" },
          { index: 4, role: "height" },
        ],
      },
      "row 2: the import profile reads column 5, but there are 2 columns.",
    ],
    [
      "a head that is not there",
      scanText([trueScan()], PLAIN),
      {
        columns: [
          { heading: "x (mm)", role: "position" },
          { heading: "z after (µm)", role: "height" },
        ],
      },
      "row 1: no column is headed “z after (µm)”, which the import profile reads.",
    ],
    [
      "another head at its place",
      scanText([trueScan()], PLAIN),
      {
        columns: [
          { index: 0, heading: "x (mm)", role: "position" },
          { index: 1, heading: "z raw (µm)", role: "height" },
        ],
      },
      "row 1: column 2 is headed “z (µm)”; by the import profile it is “z raw (µm)”.",
    ],
    [
      "a unit of something else",
      scanText([trueScan()], { ...PLAIN, lines: [] }),
      { units: { position: "mm", height: "MPa" } },
      "column 2 is taken as height, but MPa is no unit of length.",
    ],
    ["another encoding", "x (mm);Höhe (µm)\n1;2\n", { encoding: "utf-16le" }, "M-0388.csv"],
  ])("%s: the file says how it differs, and where", (_, text, profile, says) => {
    expect(refusalOf(text, profile)).toContain(says);
  });

  it("names the columns where nothing else does", () => {
    const text = rows((n) => `${n}.5,${(n * 7) % 5}.25,${(n * 3) % 4}.5`);
    const columns = [
      { index: 0, role: "position", unit: "mm" },
      { index: 2, role: "height", unit: "nm" },
    ] satisfies ImportProfile["columns"];
    expect(read(text, { columns })[0]).toMatchObject({ position: 0, height: 2 });
  });

  it("refuses what it could not mean", () => {
    for (const wrong of [
      { delimiter: "a" },
      { delimiter: ", " },
      { columns: [{ role: "height" }] },
      { units: { height: "parsec" } },
      { strange: 1 },
    ])
      expect(importProfileSchema.safeParse(wrong).success).toBe(false);
  });
});

import { describe, expect, it } from "vitest";
import { changedBatch, EMPTY_BATCH, MOST_FILES, type Batch } from "#app/lib/scan-import/batch.ts";
import { azimuthOf, takenLines } from "#app/lib/scan-import/place-words.ts";
import { batchPlan } from "#app/lib/scan-import/plan.ts";
import { PLAIN, scanFile, scanText, trueScan } from "#tests/fixtures/scan-files.ts";
import { batchFile, toldOf } from "./told.ts";

const SCAN = scanFile(trueScan(), {}).bytes;
const SUMMARY = `Slot;Bow (µm);Warp (µm)\n${Array.from({ length: 8 }, (_, n) => `${n + 1};${n}.5;9.5`).join("\n")}`;
const file = (name: string, size = 1) => new File(["x".repeat(size)], name, { lastModified: 1 });
const batchOf = (...names: string[]) =>
  changedBatch(EMPTY_BATCH, { kind: "add", files: names.map((name) => file(name)) });
const first = ({ files: [one] }: Batch) => {
  if (!one) throw new Error("the batch is empty");
  return one;
};

describe("a batch", () => {
  it("takes each file once, and no more than it may have", () => {
    const batch = batchOf("a.csv", "b.csv");
    const again = changedBatch(batch, { kind: "add", files: [file("b.csv"), file("c.csv")] });
    expect(again.files.map(({ file: { name } }) => name)).toEqual(["a.csv", "b.csv", "c.csv"]);
    expect(again.passedOver.twice).toBe(1);
    const many = changedBatch(batch, {
      kind: "add",
      files: Array.from({ length: MOST_FILES }, (_, n) => file(`${n}.csv`)),
    });
    expect(many.files).toHaveLength(MOST_FILES);
    expect(many.passedOver.tooMany).toBe(2);
  });

  it("gives a file that is added after another was taken out a key of its own", () => {
    const batch = changedBatch(batchOf("a.csv", "b.csv"), { kind: "remove", keys: ["file-2"] });
    expect(changedBatch(batch, { kind: "add", files: [file("c.csv")] }).files.map(({ key }) => key)).toEqual([
      "file-1",
      "file-3",
    ]);
  });

  it("refuses a file that is too large without reading it", () => {
    const batch = changedBatch(EMPTY_BATCH, { kind: "add", files: [file("large.csv", 49 * 1024 * 1024)] });
    expect(first(batch)).toMatchObject({ done: null, told: { outcome: "refused" } });
  });

  it("passes over what is said of an earlier profile", async () => {
    const batch = batchOf("a.csv");
    const { key } = first(batch);
    const changed = changedBatch(batch, { kind: "profile", key, profile: { decimalMark: "comma" } });
    const said = { key, revision: 1, kind: "told", told: await toldOf(SCAN) } as const;
    expect(first(changedBatch(changed, { kind: "said", said })).told).toBeNull();
    expect(first(changedBatch(changed, { kind: "said", said: { ...said, revision: 2 } })).told?.outcome).toBe("read");
  });

  it("gives what was answered to the others and keeps what they have of their own", () => {
    const batch = batchOf("a.csv", "b.csv");
    const own = changedBatch(batch, { kind: "profile", key: "file-2", profile: { encoding: "utf-8" } });
    const profile = { decimalMark: "point" } as const;
    const chosen = changedBatch(own, { kind: "instrument", key: "file-1", instrument: "stylus", profile });
    const all = changedBatch(chosen, { kind: "profile of all", from: "file-1" });
    expect(all.files.map((each) => [each.profile, each.revision, each.instrument])).toEqual([
      [{ decimalMark: "point" }, 2, "stylus"],
      [{ encoding: "utf-8", decimalMark: "point" }, 3, "stylus"],
    ]);
  });
});

describe("what a batch brings in", () => {
  it("are pairs by wafer and line, whichever way the line was run, files that wait, and tables; the rest stays", async () => {
    const files = await Promise.all([
      batchFile("M-1_az000_pre.csv", SCAN),
      batchFile("M-1_az045_pre.csv", SCAN),
      batchFile("m-1_az180_post.csv", SCAN),
      batchFile("L9_s3_post.csv", SCAN, { wafer: "" }),
      batchFile("M-3.csv", SCAN),
      batchFile("M-4_pre.csv", "x,z\n1.5,2.5\n2.5,3.5\n4.5,1.5\n"),
      batchFile("M-5_pre.csv", "PK"),
      batchFile("pre.csv", SCAN),
      batchFile("M-6_pre.csv", SCAN, { azimuth: "north" }),
      batchFile("figures_L7.csv", SUMMARY),
    ]);
    const { items, staying } = batchPlan(files);
    expect(items.map((item) => [item.label, item.files.map(({ key }) => key), item.words])).toEqual([
      ["M-1, 0°", ["M-1_az000_pre.csv", "m-1_az180_post.csv"], expect.stringMatching(/after the film$/)],
      ["M-1, 45°", ["M-1_az045_pre.csv"], "M-1_az045_pre.csv before the film; its partner is not in this batch"],
      ["lot L9, slot 3, 0°", ["L9_s3_post.csv"], expect.stringMatching(/^L9_s3_post\.csv after the film/)],
      ["figures_L7.csv", ["figures_L7.csv"], "a summary; where a row names none, lot L7"],
    ]);
    expect(staying.map(({ file: { key }, why }) => [key, why])).toEqual([
      ["M-3.csv", "is not said to be before or after the film."],
      ["M-4_pre.csv", "has an open question."],
      ["M-5_pre.csv", "cannot be read."],
      ["pre.csv", "has no wafer yet."],
      ["M-6_pre.csv", "has an azimuth that is no angle of 0 to 360°."],
    ]);
  });

  it("takes of several profiles those whose azimuth is known, from its head or typed", async () => {
    const scan = trueScan();
    const lines = ["x (mm),z 0° (µm),x (mm),z 90° (µm),x (mm),z spare (µm)"];
    const text = scanText([scan, scan, scan], { ...PLAIN, lines });
    const several = await batchFile("M-7_pre.csv", text);
    expect(takenLines(several)).toEqual([
      { profile: 0, degrees: 0 },
      { profile: 1, degrees: 90 },
    ]);
    expect(takenLines({ ...several, azimuths: { 1: "", 2: "45" } })).toEqual([
      { profile: 0, degrees: 0 },
      { profile: 2, degrees: 45 },
    ]);
    expect(takenLines({ ...several, azimuths: { 2: "east" } })).toBeNull();
    expect(batchPlan([several]).items[0]?.words).toContain("along 0°, 90°");
    const none = batchPlan([{ ...several, azimuths: { 0: "", 1: "" } }]);
    expect(none.staying[0]?.why).toMatch(/type the azimuth/);
  });

  it.each([
    ["", 0],
    ["45", 45],
    ["22,5 °", 22.5],
    ["361", null],
    ["-5", null],
    ["east", null],
  ])("the azimuth %j is %s", (azimuth, degrees) => expect(azimuthOf({ azimuth })).toBe(degrees));
});

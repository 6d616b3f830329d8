import { describe, expect, it } from "vitest";
import { changedBatch, EMPTY_BATCH, MOST_FILES, type Batch } from "#app/lib/scan-import/batch.ts";
import { azimuthOf, batchPairs } from "#app/lib/scan-import/pairs.ts";
import { scanFile, trueScan } from "#tests/fixtures/scan-files.ts";
import { batchFile, toldOf } from "./told.ts";

const SCAN = scanFile(trueScan(), {}).bytes;
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
    const all = changedBatch(own, { kind: "profile of all", from: "file-1", profile: { decimalMark: "point" } });
    expect(all.files.map(({ profile, revision }) => [profile, revision])).toEqual([
      [{}, 1],
      [{ encoding: "utf-8", decimalMark: "point" }, 3],
    ]);
  });
});

describe("pairs", () => {
  it("are made by wafer and line, whichever way the line was run; the rest stays with a sentence", async () => {
    const files = await Promise.all([
      batchFile("M-1_az000_pre.csv", SCAN),
      batchFile("M-1_az045_pre.csv", SCAN),
      batchFile("m-1_az180_post.csv", SCAN),
      batchFile("M-2_post.csv", SCAN),
      batchFile("M-3.csv", SCAN),
      batchFile("M-4_pre.csv", "x,z\n1.5,2.5\n2.5,3.5\n4.5,1.5\n"),
      batchFile("M-5_pre.csv", "PK"),
      batchFile("pre.csv", SCAN),
      batchFile("M-6_pre.csv", SCAN, { azimuth: "north" }),
    ]);
    const { pairs, staying } = batchPairs(files);
    expect(pairs.map(({ before, after, label }) => [before.key, after.key, label])).toEqual([
      ["M-1_az000_pre.csv", "m-1_az180_post.csv", "M-1, 0°"],
    ]);
    expect(staying.map(({ file: { key }, why }) => [key, why])).toEqual([
      ["M-1_az045_pre.csv", expect.stringMatching(/^waits for its scan after the film/)],
      ["M-2_post.csv", expect.stringMatching(/^waits for its scan before the film/)],
      ["M-3.csv", "is not said to be before or after the film."],
      ["M-4_pre.csv", "has an open question."],
      ["M-5_pre.csv", "cannot be read."],
      ["pre.csv", "has no wafer yet."],
      ["M-6_pre.csv", "has an azimuth that is no angle of 0 to 360°."],
    ]);
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

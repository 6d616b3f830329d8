import { describe, expect, test } from "vitest";
import { entryWords } from "#app/lib/floor/entry-words.ts";
import { floorPath } from "#app/lib/floor/floor-path.ts";
import { timeWords } from "#app/lib/floor/time-words.ts";

describe("words of the floor", () => {
  test("a reading says its sign, unit and how it was taken", () => {
    const reading = {
      kind: "measured" as const,
      what: "bow" as const,
      value: -41e-6,
      uncertainty: null,
      wafer: "W03",
      on: "three pins" as const,
      sideUp: "device side" as const,
      gravity: "taken out" as const,
      remark: "",
    };
    expect(entryWords(reading)).toBe("W03: bow −41\u00A0µm, on three pins, device side up, own weight taken out");
    expect(entryWords({ ...reading, what: "warp", value: 43e-6, uncertainty: 5e-6, wafer: "", remark: "twice" })).toBe(
      "warp 43 ± 5\u00A0µm, on three pins, device side up, own weight taken out. “twice”",
    );
    expect(entryWords({ kind: "done", count: 1 })).toBe("done, 1 wafer");
  });

  test("a time is never longer than it is", () => {
    expect(timeWords(59)).toBe("0\u00A0min");
    expect(timeWords(3 * 3600 + 20 * 60 + 59)).toBe("3\u00A0h 20\u00A0min");
    expect(timeWords(2 * 86_400 + 5 * 3600 + 3599)).toBe("2\u00A0d 5\u00A0h");
    expect(timeWords(-3600)).toBe("1\u00A0h");
  });

  test("an address names the part of the flow only where there are several", () => {
    expect(floorPath("l", null, 0)).toBe("/floor/lots/l");
    expect(floorPath("l", 4, 2, "stop")).toBe("/floor/lots/l/steps/4?part=2&do=stop");
  });
});

import { describe, expect, it } from "vitest";
import { auditValue } from "#app/lib/audit-value.ts";

describe("a value of the audit trail", () => {
  it.each<[value: unknown, words: string]>([
    ["letter", "letter"],
    [775e-6, "0.000775"],
    [null, "nothing"],
    [["film", "tape"], "film, tape"],
    [{ place: "bench", note: "", file: "692e7bf2-c66e-4dc0-8e6c-848de1651a35", by: null }, "place bench"],
    [{ stress: { value: 25e6, source: "measured" } }, "stress (value 25000000, source measured)"],
    ["<script>alert(1)</script>", "<script>alert(1)</script>"],
  ])("%j", (value, words) => {
    expect(auditValue(JSON.stringify(value))).toBe(words);
  });
});

import { expect, it } from "vitest";
import { revisionLetters } from "#app/lib/assessment-revision.ts";

it.each([
  [1, "A"],
  [2, "B"],
  [26, "Z"],
  [27, "AA"],
  [52, "AZ"],
  [53, "BA"],
  [702, "ZZ"],
  [703, "AAA"],
])("assessment %i of a flow is revision %s", (number, letters) => {
  expect(revisionLetters(number)).toBe(letters);
});

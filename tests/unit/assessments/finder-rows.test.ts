import { expect, test } from "vitest";
import { findBonds } from "#app/engine/finder/find-bonds.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { chosenRows, FINDER_SORTS, finderCsv, finderPage, finderRow } from "#app/lib/finder-rows.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { demoCatalogue } from "#tests/fixtures/demo-catalogue.ts";
import { demoFlow } from "#tests/fixtures/demo-flow-input.ts";

const found = findBonds(demoFlow("Petrel, glass 3.3 ppm").flow, defaultLimits(), demoCatalogue);
const rows = found.tried.map((tried) => finderRow(tried, found.span.from));

const asked = (search: string) =>
  chosenRows(rows, readListParams(new URLSearchParams(search), { sorts: FINDER_SORTS, filters: ["fits"] }));

test("without a wish the rows stand as they were found, what fits first", () => {
  expect(asked("")).toEqual(rows);
  expect(asked("fits=yes").length + asked("fits=no").length).toBe(rows.length);
});

test("a search looks at carrier, material, release and reason", () => {
  expect(asked("q=does not pass").every(({ reason }) => reason?.text.includes("does not pass"))).toBe(true);
  expect(asked("q=WAX").every(({ material }) => material === "Wax F")).toBe(true);
  expect(asked("q=nothing like it")).toEqual([]);
});

test("a sort goes both ways, and a page is a part of it", () => {
  const up = asked("sort=thickness").map(({ thickness }) => thickness);
  expect(up).toEqual(up.toSorted((a, b) => a - b));
  expect(asked("sort=-thickness").map(({ thickness }) => thickness)).toEqual(up.toReversed());
  const params = readListParams(new URLSearchParams("page=2"), { sorts: FINDER_SORTS });
  expect(finderPage(rows, params).rows[0]).toBe(rows[25]);
});

test("a row that does not fit says rule, step, figure and limit; the planned one is not to be tried", () => {
  const planned = rows.find((row) => row.planned);
  expect(planned).toMatchObject({ fits: false, posted: null, reason: { step: 10, rule: 2 } });
  expect(planned?.reason?.figure?.replaceAll("\u00a0", " ")).toBe("425 µm");
  expect(planned?.reason?.limit?.replaceAll("\u00a0", " ")).toBe("300 µm");
});

test("the file has a head and a line for every row, and runs no formula", () => {
  const [first, ...others] = rows;
  if (!first) throw new Error("the finder tries something");
  const lines = finderCsv([{ ...first, carrier: "=1+1" }, ...others])
    .trimEnd()
    .split("\r\n");
  expect(lines).toHaveLength(rows.length + 1);
  expect(lines[0]).toContain("thickness_um");
  expect(lines[1]?.startsWith("'=1+1")).toBe(true);
});

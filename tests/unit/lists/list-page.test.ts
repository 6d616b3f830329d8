import { describe, expect, test } from "vitest";
import { liesIn } from "#app/lib/current-place.ts";
import { PAGE_SIZE } from "#app/lib/list-params.ts";
import { withinPages } from "#app/server/list-page.server.ts";

const at = (page: number, total: number) => ({
  rows: [],
  total,
  params: { query: "", sort: "name", descending: false, page, filters: {} },
});
const url = (search: string) => new URL(`http://planeward.example/films${search}`);

describe("a page of a list", () => {
  test.each([
    [1, 0],
    [1, 3],
    [2, PAGE_SIZE + 1],
  ])("%i of %i rows is what it is", (page, total) => {
    const asked = at(page, total);
    expect(withinPages(url(`?page=${page}`), asked)).toBe(asked);
  });

  test.each([
    [2, PAGE_SIZE, "?q=polymer&page=2", "/films?q=polymer"],
    [9, PAGE_SIZE * 2, "?page=9&sort=-name", "/films?page=2&sort=-name"],
    [5, 0, "?q=parsecs&page=5", "/films?q=parsecs"],
  ])("%i of %i rows leads to the last one, with the search kept", (page, total, search, target) => {
    let thrown: unknown;
    try {
      withinPages(url(search), at(page, total));
    } catch (redirection) {
      thrown = redirection;
    }
    expect(thrown).toBeInstanceOf(Response);
    expect((thrown as Response).headers.get("Location")).toBe(target);
  });
});

test.each([
  ["/", "/", true],
  ["/", "/films", false],
  ["/films", "/films/new", true],
  ["/films", "/filmstrip", false],
  ["/flows", "/assessments/1/working", true],
  ["/sheets", "/assessments/1", false],
])("the place %s and the address %s: %s", (path, address, lies) => {
  expect(liesIn(path, address)).toBe(lies);
});

import { expect, it } from "vitest";
import { withLeft, type TickedRow } from "#app/lib/ticked-rows.ts";

const row = (id: string, state: TickedRow["state"], words: string): TickedRow => ({
  id,
  name: id,
  program: "Tern",
  path: `/flows/${id}`,
  version: 1,
  state,
  words,
});

it("adds to what was done the rows that were left from the beginning, each once, and none that is yet to be done", () => {
  const done = {
    rows: [row("a", "done", "Revision B: clear."), row("b", "left", "It cannot be computed.")],
    hidden: 1,
  };
  // As the page asks again afterwards: what was done is up to date now.
  const asked = {
    rows: [
      row("a", "left", "Revision B is up to date."),
      row("b", "to do", "Not assessed yet."),
      row("c", "left", "Your role may not."),
      row("d", "to do", "Not assessed yet."),
    ],
    hidden: 4,
  };
  const { rows, hidden } = withLeft(done, asked);
  expect(rows.map(({ id, words }) => [id, words])).toEqual([
    ["a", "Revision B: clear."],
    ["b", "It cannot be computed."],
    ["c", "Your role may not."],
  ]);
  expect(hidden).toBe(1);
});

import fc from "fast-check";
import { expect, it } from "vitest";
import { historyPosition } from "#app/lib/flow-history.ts";
import type { RevisionKind } from "#app/schemas/flow-plan.ts";

const revisions = (...kinds: RevisionKind[]) => kinds.map((kind, index) => ({ number: index + 1, kind }));

it("has nothing to undo before the first change", () => {
  expect(historyPosition([])).toEqual({ now: null, before: null, after: null });
  expect(historyPosition(revisions("start"))).toEqual({ now: 1, before: null, after: null });
});

it("walks back and forth through the changes, one by one", () => {
  expect(historyPosition(revisions("start", "edit", "edit"))).toEqual({ now: 3, before: 2, after: null });
  expect(historyPosition(revisions("start", "edit", "edit", "undo"))).toEqual({ now: 2, before: 1, after: 3 });
  expect(historyPosition(revisions("start", "edit", "edit", "undo", "undo"))).toEqual({
    now: 1,
    before: null,
    after: 2,
  });
  expect(historyPosition(revisions("start", "edit", "edit", "undo", "undo", "redo"))).toEqual({
    now: 2,
    before: 1,
    after: 3,
  });
});

it("has nothing to redo after a new change, and undoes to what stood before it", () => {
  expect(historyPosition(revisions("start", "edit", "undo", "edit"))).toEqual({ now: 4, before: 1, after: null });
});

it("always stands on a revision that holds a plan, and undo followed by redo changes nothing", () => {
  const kinds = fc.array(fc.constantFrom<RevisionKind>("edit", "undo", "redo"), { maxLength: 40 });
  fc.assert(
    fc.property(kinds, (later) => {
      // Only what is possible is ever noted.
      const done: RevisionKind[] = ["start"];
      for (const kind of later) {
        const { before, after } = historyPosition(revisions(...done));
        if (kind === "edit" || (kind === "undo" ? before !== null : after !== null)) done.push(kind);
      }
      const position = historyPosition(revisions(...done));
      expect(done[(position.now ?? 0) - 1]).toMatch(/start|edit/);
      if (position.before !== null) expect(historyPosition(revisions(...done, "undo", "redo"))).toEqual(position);
    }),
  );
});

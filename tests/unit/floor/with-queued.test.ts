import { expect, test } from "vitest";
import type { QueuedEntry } from "#app/lib/floor/floor-store.ts";
import { withQueued } from "#app/lib/floor/with-queued.ts";

const SHOWN = {
  pin: { revision: "r", fromStep: 1 },
  leg: 0,
  steps: [{ number: 1 }, { number: 2 }, { number: 3 }],
  progress: { underWay: null, here: 2, done: [1], missing: [] },
  acknowledgedAt: null,
};
const entry = (fields: Record<string, string>, refused: string | null = null): QueuedEntry => ({
  id: "",
  person: "",
  lot: "",
  words: "",
  at: "2026-12-01T10:00:00.000Z",
  fields: Object.entries({ revision: "r", leg: "0", ...fields }),
  refused,
});

test("what waits to be sent moves the lot on this device", () => {
  expect(withQueued(SHOWN, [])).toEqual({ progress: SHOWN.progress, acknowledgedAt: null });
  const started = entry({ kind: "started", step: "2" });
  expect(withQueued(SHOWN, [started]).progress).toMatchObject({ underWay: 2, here: 2, done: [1] });
  expect(withQueued(SHOWN, [started, entry({ kind: "done", step: "2" })]).progress).toMatchObject({
    underWay: null,
    here: 3,
    done: [1, 2],
  });
});

test("it acknowledges the sheet, once", () => {
  const acknowledged = entry({ kind: "acknowledged", step: "" });
  expect(withQueued(SHOWN, [acknowledged]).acknowledgedAt).toBe(acknowledged.at);
  expect(withQueued({ ...SHOWN, acknowledgedAt: "before" }, [acknowledged]).acknowledgedAt).toBe("before");
});

test("what was refused, or is of another revision or part, moves nothing", () => {
  const fields = { kind: "started", step: "2" };
  for (const each of [entry(fields, "no"), entry({ ...fields, revision: "s" }), entry({ ...fields, leg: "2" })])
    expect(withQueued(SHOWN, [each]).progress).toEqual(SHOWN.progress);
});

import { afterEach, describe, expect, it, vi } from "vitest";
import { deliver } from "#app/lib/floor/deliver.ts";
import type { QueuedEntry } from "#app/lib/floor/floor-store.ts";

const ENTRY: QueuedEntry = {
  id: "11111111-1111-4111-8111-111111111111",
  person: "p",
  lot: "l",
  words: "Step 1 started",
  at: "2026-12-02T20:00:00.000Z",
  fields: [["kind", "started"]],
  refused: null,
};
const answers = (answer: Response | Error) =>
  vi.stubGlobal("fetch", () => (answer instanceof Error ? Promise.reject(answer) : Promise.resolve(answer)));

afterEach(() => vi.unstubAllGlobals());

describe("an entry that was sent", () => {
  it("is stored when the server says so", async () => {
    answers(Response.json({ outcome: "stored" }));
    expect(await deliver(ENTRY)).toEqual({ outcome: "stored" });
  });

  it("is refused with the server's sentence, of whatever kind the refusal is", async () => {
    answers(Response.json({ outcome: "refused", sentence: "The lot is held." }, { status: 409 }));
    expect(await deliver(ENTRY)).toEqual({ outcome: "refused", sentence: "The lot is held." });
    answers(Response.json({ sentence: "There is no such lot." }, { status: 404 }));
    expect(await deliver(ENTRY)).toEqual({ outcome: "refused", sentence: "There is no such lot." });
    answers(Response.json({ outcome: "refused", sentence: null }, { status: 400 }));
    expect(await deliver(ENTRY)).toMatchObject({
      outcome: "refused",
      sentence: expect.stringContaining("field") as string,
    });
  });

  it.each<[string, Response | Error]>([
    ["there is no connection", new TypeError("failed to fetch")],
    ["a network answers with a page of its own", new Response("<html>Sign in to the network</html>", { status: 200 })],
    ["something in between refuses it", new Response("busy", { status: 429 })],
    ["the server stumbles", new Response("", { status: 502 })],
    ["nobody is signed in any more", new Response("", { status: 401 })],
  ])("waits where %s, and is never taken for stored", async (_, answer) => {
    answers(answer);
    expect(await deliver(ENTRY)).toMatchObject({ outcome: "waits" });
  });
});

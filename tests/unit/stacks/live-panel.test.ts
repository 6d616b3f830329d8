/* What a page computes while somebody types is what the API and the server's page answer, to the last digit. */
import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { workingsOfRequest } from "#app/lib/estimate-workings.ts";
import { livePanel, PanelRefused } from "#app/lib/live-panel.ts";
import { stackDraft } from "#app/lib/stack-draft.ts";
import { panelRequests, type PanelRequests } from "#app/lib/stack-panel.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import { answerEstimate, stackPanel } from "#app/services/estimate-answer.ts";
import { readEstimateRequest } from "#app/services/estimate-request.ts";
import { CHOICES, TEXT } from "./samples.ts";

const limits = defaultLimits();
const never = new AbortController().signal;

const at = (thickness: string): StackText => ({ ...TEXT, siliconThickness: { value: thickness, tolerance: "3 µm" } });

function requestsOf(text: StackText, temperature: number | null): PanelRequests {
  const requests = panelRequests(stackDraft(text, CHOICES), temperature);
  if (!requests) throw new Error("The sample is complete.");
  return requests;
}

/** What the API answers to a request that has been sent. */
const sent = (request: EstimateRequest) =>
  answerEstimate(readEstimateRequest(JSON.parse(JSON.stringify(request))), limits);

describe("the panel that a page computes", () => {
  it.each(["725 µm", "350 µm", "100 µm", "40 µm"])("at %s has the API's answers", async (thickness) => {
    const requests = requestsOf(at(thickness), 518.15);
    const { room, hot } = await livePanel(requests, limits, never);
    const { working, ...answer } = sent(requests.room);
    expect(room).toEqual({ request: requests.room, answer });
    expect(working).toBeDefined();
    expect(hot).toEqual({ request: requests.hot, answer: requests.hot && sent(requests.hot) });
  });

  it("is the one that the server's page comes with, but for the workings, which are the same when asked for", async () => {
    const requests = requestsOf(at("200 µm"), null);
    const served = stackPanel(stackDraft(at("200 µm"), CHOICES), null, limits);
    const live = await livePanel(requests, limits, never);
    const working = workingsOfRequest(live.room.request);
    expect({ ...live, room: { ...live.room, answer: { ...live.room.answer, working } } }).toEqual(served);
  });

  it("says in a sentence what the engine refuses, and stops when it is called off", async () => {
    const { room } = requestsOf(at("200 µm"), null);
    const tooSmall = { room: { ...room, wafer: { ...room.wafer, diameter_m: 1e-4 } }, hot: null };
    const refused = livePanel(tooSmall, limits, never);
    await expect(refused).rejects.toThrow(PanelRefused);
    await expect(refused).rejects.toThrow(/^This stack cannot be estimated: .+\.$/);
    const calledOff = new AbortController();
    const run = livePanel({ room, hot: null }, limits, calledOff.signal);
    calledOff.abort();
    await expect(run).rejects.toThrow(/abort/i);
  });
});

import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { EstimateRefused, estimating } from "./estimate-answer.ts";
import type { PanelRequests, StackPanel } from "./stack-panel.ts";
import type { Estimated } from "./stack-words.ts";

/** A stack that the engine cannot take; the message is a sentence for the person who typed it. */
export class PanelRefused extends Error {}

/** Lets the page paint and take what was typed. */
const breath = () => new Promise<void>((resolve) => setTimeout(resolve));

/**
 * The panel of a stack as the server would make it, by the same code, in parts between which the page stays free; without the
 * workings, which are made where they are looked at.
 * @throws PanelRefused for what the engine cannot take, the signal's reason when it was called off
 */
export async function livePanel(
  { room, hot }: PanelRequests,
  limits: SiteLimits,
  signal: AbortSignal,
): Promise<StackPanel> {
  return { room: await estimated(room, limits, signal), hot: hot && (await estimated(hot, limits, signal)) };
}

async function estimated(request: PanelRequests["room"], limits: SiteLimits, signal: AbortSignal): Promise<Estimated> {
  const run = estimating(request, limits, null);
  for (;;) {
    signal.throwIfAborted();
    const step = nextOf(run);
    if (step.done) return { request, answer: step.value };
    await breath();
  }
}

function nextOf(run: ReturnType<typeof estimating>) {
  try {
    return run.next();
  } catch (error) {
    if (!(error instanceof EstimateRefused)) throw error;
    throw new PanelRefused(`This stack cannot be estimated: ${error.faults[0]?.detail ?? "the engine refused it"}.`);
  }
}

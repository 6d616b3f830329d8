import type { WindowQuestion } from "#app/schemas/process-window.ts";
import type { TrialQuestion } from "#app/schemas/trial.ts";
import { remediesRun } from "./remedies-run.ts";
import { wafersRun } from "./wafers-run.ts";
import { windowRun } from "./window-run.ts";
import { tellRun, type RunMessage } from "./worker-run.ts";

/** What can be asked about an assessed flow. */
export type FlowQuestion =
  { task: "remedies" | "wafers"; question: TrialQuestion } | { task: "window"; question: WindowQuestion };

const say = (message: RunMessage<unknown>) => globalThis.postMessage(message);

/** Answers one question; whoever asked ends the worker to stop it. */
globalThis.addEventListener("message", ({ data }: MessageEvent<FlowQuestion>) => {
  switch (data.task) {
    case "remedies":
      return tellRun(remediesRun(data.question), say);
    case "wafers":
      return tellRun(wafersRun(data.question), say);
    case "window":
      return tellRun(windowRun(data.question), say);
  }
});

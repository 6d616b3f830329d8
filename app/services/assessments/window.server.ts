import { EngineInputError } from "#app/engine/errors.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { choiceText, usualRange, windowChoices, windowInput, type WindowChoice } from "#app/lib/window-inputs.ts";
import { windowRun } from "#app/lib/window-run.ts";
import { refusalWords } from "#app/lib/worker-run.ts";
import type { AskedAxis, SentWindow, WindowPageData } from "#app/schemas/process-window.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { inTurns } from "./in-turns.server.ts";
import { sentGround, trialGround, trialHead, type TrialGround } from "./trial-ground.server.ts";

/** The verdict of an assessment's flow over two of its inputs, as the address asks. */
export async function windowOf(
  scope: ActorScope,
  assessmentId: string | undefined,
  search: URLSearchParams,
): Promise<WindowPageData> {
  const { page, question } = readWindow(await trialGround(scope, assessmentId, search), search);
  if (!question) return page;
  try {
    return { ...page, drawing: await inTurns(windowRun(question)) };
  } catch (error) {
    if (error instanceof EngineInputError) return { ...page, fault: refusalWords(error) };
    throw error;
  }
}

/** The same as it is asked, for the engine in the browser of somebody who may have the inputs. */
export async function windowAsked(
  scope: ActorScope,
  assessmentId: string | undefined,
  search: URLSearchParams,
): Promise<SentWindow> {
  return readWindow(await sentGround(scope, assessmentId, search), search);
}

/**
 * What an address asks of a window. Nothing is drawn until two inputs are chosen; a range left blank is the usual one about what is
 * planned. `step` judges one step alone: elsewhere something else may bar the flow.
 */
function readWindow(ground: TrialGround, search: URLSearchParams): SentWindow {
  const { flow, limits } = ground.input;
  const choices = windowChoices(flow);
  const [x, y] = [readAxis(search, "x", choices), readAxis(search, "y", choices)];
  const steps = flow.steps.map(({ title }, index) => ({ number: index + 1, title }));
  const step = steps.find(({ number }) => String(number) === search.get("step"))?.number ?? null;
  const asked = { head: trialHead(ground), inputs: choices.map(windowInput), steps, step, x: x.asked, y: y.asked };
  const page = { ...asked, fault: null, drawing: null };
  if (!x.choice || !y.choice) return { page, question: null };
  if (x.choice === y.choice) return { page: { ...page, fault: "Choose two different inputs." }, question: null };
  if (!x.range || !y.range) return { page, question: null };
  const sides = { x: { input: x.choice.key, ...x.range }, y: { input: y.choice.key, ...y.range } };
  return { page, question: { flow, limits, ...sides, step } };
}

function readAxis(search: URLSearchParams, name: "x" | "y", choices: readonly WindowChoice[]) {
  const text = (key: string) => (search.get(key) ?? "").trim().slice(0, 60);
  const choice = choices.find(({ key }) => key === text(name)) ?? null;
  const asked: AskedAxis = { input: choice?.key ?? "", from: text(`${name}-from`), to: text(`${name}-to`), faults: {} };
  if (!choice) return { choice, asked, range: null };
  const usual = usualRange(choice);
  const end = (side: "from" | "to"): number | null => {
    if (asked[side] === "") {
      asked[side] = choiceText(choice, usual[side]);
      return usual[side];
    }
    const read = readQuantity(asked[side], choice.rule);
    if (read.ok) return read.value;
    asked.faults[side] = read.message;
    return null;
  };
  const [from, to] = [end("from"), end("to")];
  if (from !== null && to !== null && !(to > from)) asked.faults.to = "This end must be above the other.";
  return { choice, asked, range: from !== null && to !== null && to > from ? { from, to } : null };
}

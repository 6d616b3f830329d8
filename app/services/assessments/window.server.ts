import { EngineInputError } from "#app/engine/errors.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { processWindow } from "#app/engine/window/window.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { windowDrawing } from "#app/lib/window-drawing.ts";
import { choiceText, usualRange, windowChoices, windowInput, type WindowChoice } from "#app/lib/window-inputs.ts";
import type { AskedAxis, WindowDrawing, WindowPageData } from "#app/schemas/process-window.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { inTurns } from "./in-turns.server.ts";
import { trialGround, trialHead } from "./trial-ground.server.ts";

/**
 * The verdict of an assessment's flow over two of its inputs, as the address asks. Nothing is drawn until two inputs are chosen;
 * a range left blank is the usual one about what is planned. `step` judges one step alone: elsewhere something else may bar the flow.
 */
export async function windowOf(
  scope: ActorScope,
  assessmentId: string | undefined,
  search: URLSearchParams,
): Promise<WindowPageData> {
  const ground = await trialGround(scope, assessmentId);
  const { flow, limits } = ground.input;
  const choices = windowChoices(flow);
  const [x, y] = [readAxis(search, "x", choices), readAxis(search, "y", choices)];
  const steps = flow.steps.map(({ title }, index) => ({ number: index + 1, title }));
  const step = steps.find(({ number }) => String(number) === search.get("step"))?.number ?? null;
  const page = { head: trialHead(ground), inputs: choices.map(windowInput), steps, step, x: x.asked, y: y.asked };
  if (!x.choice || !y.choice) return { ...page, fault: null, drawing: null };
  if (x.choice === y.choice) return { ...page, fault: "Choose two different inputs.", drawing: null };
  if (!x.range || !y.range) return { ...page, fault: null, drawing: null };
  const axes = { x: { ...x.choice, ...x.range }, y: { ...y.choice, ...y.range } };
  const drawing = await drawn(flow, limits, axes, step);
  return typeof drawing === "string" ? { ...page, fault: drawing, drawing: null } : { ...page, fault: null, drawing };
}

type Axis = WindowChoice & { from: number; to: number };

async function drawn(
  flow: FlowInput,
  limits: SiteLimits,
  axes: { x: Axis; y: Axis },
  step: number | null,
): Promise<WindowDrawing | string> {
  try {
    return windowDrawing(await inTurns(processWindow(flow, limits, axes, { step })), axes);
  } catch (error) {
    if (error instanceof EngineInputError) return `This cannot be computed: ${error.reason}.`;
    throw error;
  }
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

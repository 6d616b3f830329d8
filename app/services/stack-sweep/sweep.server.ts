import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { answerOf, SWEEP_ANSWERS } from "#app/lib/stack-sweep/answers.ts";
import { readSweep, type AskedSide, type SweepAsked } from "#app/lib/stack-sweep/asked.ts";
import { readAxis } from "#app/lib/stack-sweep/axis.ts";
import { sweepInputs, type SweepInput } from "#app/lib/stack-sweep/inputs.ts";
import { limitChoices, limitsAsked } from "#app/lib/stack-sweep/limits.ts";
import { inputText } from "#app/lib/stack-sweep/sentences.ts";
import { sweptView } from "#app/lib/stack-sweep/view.ts";
import { stackOf } from "#app/lib/stack-of-request.ts";
import { viewTemperature } from "#app/lib/stack-view.ts";
import type { SweepView, SweptView } from "#app/schemas/stack-sweep.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { siteLimits } from "../limits.server.ts";
import { toolsOf } from "../comparison.server.ts";
import { getStack, requestOf } from "../stacks.server.ts";

/**
 * A sweep of a stack as its address asks for it; `swept` null while something is wrong with what was typed.
 * @throws 404 for a stack that is not there or not the person's to see
 */
export async function stackSweep(
  scope: ActorScope,
  id: string | undefined,
  search: URLSearchParams,
): Promise<SweepView> {
  const detail = await getStack(scope, id);
  const [site, tools] = await Promise.all([siteLimits(scope), toolsOf(scope)]);
  const typed = readSweep(search);
  const asked: SweepAsked = { ...typed, x: { ...typed.x, input: typed.x.input || "silicon" } };
  const faults: SweepView["faults"] = { x: {}, y: {} };
  const { temperature, read } = viewTemperature(asked.at);
  if (read && !read.ok) faults.at = read.message;
  const stack = { ...stackOf(requestOf(detail)), ...(temperature !== null && { temperature }) };
  const inputs = sweepInputs(detail, stack, temperature ?? ROOM_TEMPERATURE);
  const answer = answerOf(asked.answer) ?? SWEEP_ANSWERS[0];
  if (!answerOf(asked.answer)) faults.answer = "There is no such answer. Choose one of the list.";
  const x = readAxis(asked.x, inputs);
  const y = asked.y.input === "" ? null : readAxis(asked.y, inputs);
  Object.assign(faults, { x: x.faults, y: y?.faults ?? {} });
  if (y && asked.y.input === asked.x.input)
    faults.y.input = "Both sides are the same input. Choose another one, or none for a curve.";
  const choices = answer ? limitChoices(answer, { tools, limits: site, diameter: stack.wafer.diameter }) : [];
  const chosen = answer && limitsAsked(asked, answer, choices);
  Object.assign(faults, chosen?.faults);
  const found =
    answer && chosen && x.axis && (y === null || y.axis) && !isWrong(faults)
      ? sweptView({ stack, x: x.axis, y: y?.axis ?? null, answer, limits: chosen.limits, site })
      : null;
  if (found?.fault) faults.whole = found.fault;
  return {
    stack: { id: detail.id, name: detail.name, program: detail.program.name },
    asked,
    inputs: inputs.map(({ key, label, ...input }) => ({
      value: key,
      label: `${label}, ${inputText(input, input.value)}`,
    })),
    limits: choices.map(({ key, label }) => ({ value: key, label })),
    usual: { x: usualOf(asked.x, inputs), y: usualOf(asked.y, inputs) },
    faults,
    swept: found?.swept ?? null,
  };
}

/** What a field left blank stands for. */
function usualOf({ input }: AskedSide, inputs: readonly SweepInput[]) {
  const found = inputs.find(({ key }) => key === input);
  return found ? { from: inputText(found, found.usual.from), to: inputText(found, found.usual.to) } : null;
}

/** Whether anything is wrong with what was asked. */
export const isWrong = ({ x, y, ...others }: SweepView["faults"]): boolean =>
  [x, y, others].some((faults) => Object.values(faults).some((fault) => fault !== undefined));

/** A sweep that is to be a file or a paper; refused while something is wrong with what was asked. */
export async function sweptStack(
  scope: ActorScope,
  id: string | undefined,
  search: URLSearchParams,
): Promise<SweepView & { swept: SweptView; name: string }> {
  const view = await stackSweep(scope, id, search);
  const { swept, stack } = view;
  if (!swept) throw problem(400, "There is nothing to draw as the address stands. Go back and mend what is marked.");
  return { ...view, swept, name: `${stack.name}, sweep`.slice(0, 120) };
}

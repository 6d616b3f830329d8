import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { readComparison, type ComparisonAsked } from "#app/lib/comparison/asked.ts";
import { allCrossings } from "#app/lib/comparison/crossing-words.ts";
import { letterOf, STACKS } from "#app/lib/comparison/kinds.ts";
import { warpLines, type ComparedTool } from "#app/lib/comparison/limit-lines.ts";
import { comparisonChart } from "#app/lib/stack-comparison/chart.ts";
import { stackCurves, stackFigures, type ComparedStack } from "#app/lib/stack-comparison/figures.ts";
import { figureGroups } from "#app/lib/stack-comparison/figure-rows.ts";
import { comparedOver, type ComparedOver } from "#app/lib/stack-comparison/over.ts";
import { inputGroups } from "#app/lib/stack-comparison/rows.ts";
import { sensitivityWords } from "#app/lib/stack-comparison/sensitivities.ts";
import { comparisonSummary } from "#app/lib/stack-comparison/summary.ts";
import { temperatureWords } from "#app/lib/stack-words.ts";
import type { ComparedStacks, StackComparisonView } from "#app/schemas/stack-comparison.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { answerOrNull } from "../estimate-answer.ts";
import { enoughToCompare, fileNameOf, toolsOf, wrongNumber } from "../comparison.server.ts";
import { siteLimits } from "../limits.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { findStacks, requestOf, stackChoices, type StackDetail } from "../stacks.server.ts";
import { isUuid } from "../uuid.server.ts";

/** Points of a curve. */
const CURVE_POINTS = 160;

/** Stacks that were asked for, as far as they are there and the person's to see. */
async function askedStacks(scope: ActorScope, search: URLSearchParams) {
  requireInSomeProgram(scope, "see the work");
  const typed = readComparison(search);
  const stacks = await findStacks(scope, typed.ids.filter(isUuid));
  const asked: ComparisonAsked = { ...typed, ids: stacks.map(({ id }) => id) };
  return { asked, stacks, missing: typed.ids.length - stacks.length };
}

/** The stacks with their figures at the temperature and with their curves over the range. */
function compared(stacks: readonly StackDetail[], over: ComparedOver, limits: SiteLimits): ComparedStack[] {
  const { temperature, range } = over;
  return stacks.map((stack, n) => {
    const request = {
      ...requestOf(stack),
      ...(temperature !== null && { temperature_K: temperature }),
      sweep: { from_m: range.from, to_m: range.to, points: CURVE_POINTS },
    };
    const answer = answerOrNull(request, limits);
    return {
      ...stack,
      letter: letterOf(n),
      figures: answer && stackFigures({ request, answer }),
    };
  });
}

const thickestOf = (stacks: readonly StackDetail[]) =>
  Math.max(
    ...stacks.map(({ silicon, siliconThickness }) => Math.max(silicon.nominalThickness, siliconThickness.value)),
  );

/** Everything that the page and the paper of a comparison show; `compared` null with fewer stacks than two or more than six. */
export async function stackComparison(scope: ActorScope, search: URLSearchParams): Promise<StackComparisonView> {
  const { asked, stacks, missing } = await askedStacks(scope, search);
  const [choices, limits, tools] = await Promise.all([stackChoices(scope), siteLimits(scope), toolsOf(scope)]);
  return {
    asked,
    missing,
    members: stacks.map(({ id, name, program }, n) => ({
      id,
      name,
      program: program.name,
      letter: letterOf(n),
    })),
    choices: choices.filter(({ id }) => !asked.ids.includes(id)),
    tools: tools.map(({ id, name }) => ({ value: id, label: name })),
    compared: enoughToCompare(stacks) ? comparedView(asked, stacks, { limits, tools }) : null,
  };
}

function comparedView(
  asked: ComparisonAsked,
  details: readonly StackDetail[],
  { limits, tools }: { limits: SiteLimits; tools: readonly ComparedTool[] },
): ComparedStacks {
  const over = comparedOver(asked, thickestOf(details));
  const { range } = over;
  const stacks = compared(details, over, limits);
  const diameters = stacks.map(({ silicon }) => silicon.diameter);
  const temperature = temperatureWords(over.temperature ?? ROOM_TEMPERATURE);
  const crossings = allCrossings(stackCurves(stacks), range);
  const chart = comparisonChart(stacks, {
    scale: asked.scale || "log",
    range,
    limits,
    warpLimits: warpLines(tools, asked.tool, diameters),
    crossings: crossings.marks,
  });
  return {
    temperature,
    faults: over.faults,
    summary: comparisonSummary(stacks, temperature, limits),
    chart,
    groups: [...figureGroups(stacks, temperature, limits), ...inputGroups(stacks)],
    sensitivities: sensitivityWords(stacks),
    crossings: crossings.words,
  };
}

/** The stacks of a comparison that is to be a file; refused unless there are two to six. */
export async function comparedStacks(
  scope: ActorScope,
  search: URLSearchParams,
): Promise<{ name: string; stacks: ComparedStack[] }> {
  const { asked, stacks } = await askedStacks(scope, search);
  if (!enoughToCompare(stacks)) throw wrongNumber(STACKS);
  const limits = await siteLimits(scope);
  return {
    name: fileNameOf(stacks),
    stacks: compared(stacks, comparedOver(asked, thickestOf(stacks)), limits),
  };
}

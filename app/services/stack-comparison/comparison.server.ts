import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { LEAST_STACKS, MOST_STACKS, readComparison, type ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import { comparisonChart, warpLines, type ComparedTool } from "#app/lib/stack-comparison/chart.ts";
import { allCrossings } from "#app/lib/stack-comparison/crossing-words.ts";
import { stackFigures, type ComparedStack } from "#app/lib/stack-comparison/figures.ts";
import { figureGroups } from "#app/lib/stack-comparison/figure-rows.ts";
import { comparedOver, type ComparedOver } from "#app/lib/stack-comparison/range.ts";
import { inputGroups } from "#app/lib/stack-comparison/rows.ts";
import { sensitivityWords } from "#app/lib/stack-comparison/sensitivities.ts";
import { comparisonSummary } from "#app/lib/stack-comparison/summary.ts";
import { temperatureWords } from "#app/lib/stack-words.ts";
import type { ComparedView, ComparisonView } from "#app/schemas/stack-comparison.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { answerOrNull } from "../estimate-answer.ts";
import { allOfLibrary } from "../library/library.server.ts";
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
      letter: String.fromCharCode(65 + n),
      figures: answer && stackFigures({ request, answer }),
    };
  });
}

const thickestOf = (stacks: readonly StackDetail[]) =>
  Math.max(
    ...stacks.map(({ silicon, siliconThickness }) => Math.max(silicon.nominalThickness, siliconThickness.value)),
  );

/** Tools with a warp limit. */
export async function toolsOf(scope: ActorScope): Promise<ComparedTool[]> {
  const tools = await allOfLibrary(scope, "equipment");
  return tools
    .map(({ id, name, warpLimitEdgesUp, warpLimitEdgesDown, largestDiameter }) => ({
      id,
      name,
      edgesUp: warpLimitEdgesUp?.value ?? null,
      edgesDown: warpLimitEdgesDown?.value ?? null,
      largestDiameter: largestDiameter.value,
    }))
    .filter(({ edgesUp, edgesDown }) => edgesUp !== null || edgesDown !== null);
}

/** Everything that the page and the paper of a comparison show; `compared` null with fewer stacks than two or more than six. */
export async function stackComparison(scope: ActorScope, search: URLSearchParams): Promise<ComparisonView> {
  const { asked, stacks, missing } = await askedStacks(scope, search);
  const [choices, limits, tools] = await Promise.all([stackChoices(scope), siteLimits(scope), toolsOf(scope)]);
  const enough = stacks.length >= LEAST_STACKS && stacks.length <= MOST_STACKS;
  return {
    asked,
    missing,
    stacks: stacks.map(({ id, name, program }, n) => ({
      id,
      name,
      program: program.name,
      letter: String.fromCharCode(65 + n),
    })),
    choices: choices.filter(({ id }) => !asked.ids.includes(id)),
    tools: tools.map(({ id, name }) => ({ value: id, label: name })),
    compared: enough ? comparedView(asked, stacks, { limits, tools }) : null,
  };
}

function comparedView(
  asked: ComparisonAsked,
  details: readonly StackDetail[],
  { limits, tools }: { limits: SiteLimits; tools: readonly ComparedTool[] },
): ComparedView {
  const over = comparedOver(asked, thickestOf(details));
  const { range } = over;
  const stacks = compared(details, over, limits);
  const diameters = stacks.map(({ silicon }) => silicon.diameter);
  const temperature = temperatureWords(over.temperature ?? ROOM_TEMPERATURE);
  const crossings = allCrossings(stacks, range);
  const chart = comparisonChart(stacks, {
    scale: asked.scale,
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
  if (stacks.length < LEAST_STACKS || stacks.length > MOST_STACKS) throw wrongNumber();
  const limits = await siteLimits(scope);
  return {
    name: stacks
      .map(({ name }) => name)
      .join(", ")
      .slice(0, 120),
    stacks: compared(stacks, comparedOver(asked, thickestOf(stacks)), limits),
  };
}

/** What a paper or a file is told that has too few stacks or too many. */
export const wrongNumber = () =>
  problem(400, "A comparison needs two to six stacks that you may see. Go back and choose them.");

import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { ComparisonAsked } from "#app/lib/comparison/asked.ts";
import { allCrossings } from "#app/lib/comparison/crossing-words.ts";
import { FLOWS, letterOf } from "#app/lib/comparison/kinds.ts";
import { warpLines, type ComparedTool } from "#app/lib/comparison/limit-lines.ts";
import { comparedRange } from "#app/lib/comparison/range.ts";
import { alignMany, type AlignedSteps } from "#app/lib/flow-comparison/align-many.ts";
import { answerGroup } from "#app/lib/flow-comparison/answer-rows.ts";
import { basisWords } from "#app/lib/flow-comparison/basis.ts";
import type { ComparedFlow } from "#app/lib/flow-comparison/figures.ts";
import { planGroup, standingGroup } from "#app/lib/flow-comparison/plan-rows.ts";
import { flowSensitivities } from "#app/lib/flow-comparison/sensitivities.ts";
import { stepCrossings } from "#app/lib/flow-comparison/step-crossings.ts";
import { placeName, stepsGroup } from "#app/lib/flow-comparison/step-rows.ts";
import { courseLines, stepsChart } from "#app/lib/flow-comparison/steps-chart.ts";
import { flowSummary } from "#app/lib/flow-comparison/summary.ts";
import { thicknessChart, thinnedFlows, thinningCurves } from "#app/lib/flow-comparison/thickness-chart.ts";
import type { StepResult } from "#app/schemas/assessment-result.ts";
import type { ComparisonFaults, CrossingWords } from "#app/schemas/comparison.ts";
import type { ComparedFlows, FlowChart, FlowComparisonView } from "#app/schemas/flow-comparison.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { enoughToCompare, fileNameOf, toolsOf, wrongNumber } from "../comparison.server.ts";
import { siteLimits } from "../limits.server.ts";
import { askedFlows, flowChoices, walkedFlows } from "./asked-flows.server.ts";

/** Everything that the page and the paper show; `compared` null with fewer flows than two or more than six. */
export async function flowComparison(scope: ActorScope, search: URLSearchParams): Promise<FlowComparisonView> {
  const { asked, flows, missing } = await askedFlows(scope, search);
  const [choices, limits, tools] = await Promise.all([flowChoices(scope), siteLimits(scope), toolsOf(scope)]);
  return {
    asked,
    missing,
    members: flows.map(({ flow: { id, name, program } }, n) => ({
      id,
      name,
      program: program.name,
      letter: letterOf(n),
    })),
    choices: choices.filter(({ id }) => !asked.ids.includes(id)),
    tools: tools.map(({ id, name }) => ({ value: id, label: name })),
    compared: enoughToCompare(flows) ? comparedView(asked, await walkedFlows(flows), { limits, tools }) : null,
  };
}

interface Site {
  limits: SiteLimits;
  tools: readonly ComparedTool[];
}

function comparedView(asked: ComparisonAsked, flows: readonly ComparedFlow[], site: Site): ComparedFlows {
  const places = alignMany(flows.map(({ figures }) => figures?.result.steps ?? []));
  return {
    ...drawnAlong(asked, flows, { places, ...site }),
    basis: basisWords(flows),
    summary: flowSummary(flows),
    groups: [answerGroup(flows), planGroup(flows), standingGroup(flows), stepsGroup(flows, places)],
    sensitivities: flowSensitivities(flows),
    notWalked: flows.flatMap(({ letter, name, reason }) => (reason === null ? [] : [{ letter, name, reason }])),
  };
}

interface Drawn {
  drawn: FlowChart;
  crossings: CrossingWords[];
  faults: ComparisonFaults;
}

/** Along the steps, where the step that decides is seen; over silicon thickness where that is asked for and a flow is thinned. */
function drawnAlong(
  asked: ComparisonAsked,
  flows: readonly ComparedFlow[],
  { places, limits, tools }: Site & { places: readonly AlignedSteps<StepResult>[] },
): Drawn {
  const thinned = thinnedFlows(flows);
  if (asked.along !== "thickness" || thinned.length === 0) {
    const lines = courseLines(flows, places);
    const { marks, words } = stepCrossings(lines, (place) => {
      const at = places[place - 1];
      return at ? placeName(at, place - 1) : "";
    });
    const scale = asked.scale || "linear";
    const chart = stepsChart(flows, places, { scale, lines, crossings: marks, tools, tool: asked.tool });
    return { drawn: { along: "steps", chart }, crossings: words, faults: {} };
  }
  const { range, faults } = comparedRange(asked, {
    from: Math.min(...thinned.map(({ thinning }) => thinning.range.from)),
    to: Math.max(...thinned.map(({ thinning }) => thinning.range.to)),
  });
  const { marks, words } = allCrossings(thinningCurves(thinned), range);
  const chart = thicknessChart(thinned, {
    scale: asked.scale || "log",
    range,
    limits,
    warpLimits: warpLines(
      tools,
      asked.tool,
      thinned.map(({ silicon }) => silicon.diameter),
    ),
    crossings: marks,
  });
  return { drawn: { along: "thickness", chart }, crossings: words, faults };
}

/** The flows of a comparison that is to be a file; refused unless there are two to six. */
export async function comparedFlows(
  scope: ActorScope,
  search: URLSearchParams,
): Promise<{ name: string; flows: ComparedFlow[] }> {
  const { flows } = await askedFlows(scope, search);
  if (!enoughToCompare(flows)) throw wrongNumber(FLOWS);
  return { name: fileNameOf(flows.map(({ flow }) => flow)), flows: await walkedFlows(flows) };
}

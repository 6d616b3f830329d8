import { LEAST_COMPARED, MOST_COMPARED } from "#app/lib/comparison/asked.ts";
import type { ComparedKind } from "#app/lib/comparison/kinds.ts";
import type { ComparedTool } from "#app/lib/comparison/limit-lines.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { allOfLibrary } from "./library/library.server.ts";

/** Whether these are two to six. */
export const enoughToCompare = ({ length }: readonly unknown[]) => length >= LEAST_COMPARED && length <= MOST_COMPARED;

/** What a paper or a file is told that has too few or too many. */
export const wrongNumber = ({ many }: ComparedKind) =>
  problem(400, `A comparison needs two to six ${many} that you may see. Go back and choose them.`);

/** Name of a file of a comparison, without its ending. */
export const fileNameOf = (members: readonly { name: string }[]) =>
  members
    .map(({ name }) => name)
    .join(", ")
    .slice(0, 120);

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

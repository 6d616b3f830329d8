import { SweepFile } from "#app/components/stacks/sweep/SweepFile.tsx";
import type { CsvMark } from "#app/lib/csv.ts";
import { answerOf } from "#app/lib/stack-sweep/answers.ts";
import { sweepCsv } from "#app/lib/stack-sweep/csv.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { svgFile } from "../svg-file.server.ts";
import { sweptStack } from "./sweep.server.ts";

/** A sweep as files; refused while something is wrong with what was asked. */
export async function sweepFile(
  scope: ActorScope,
  id: string | undefined,
  search: URLSearchParams,
): Promise<{ name: string; csv: (mark?: CsvMark) => string; svg: () => string }> {
  const { name, stack, swept } = await sweptStack(scope, id, search);
  const answer = answerOf(swept.answer);
  return {
    name,
    csv: (mark) => (answer ? sweepCsv(swept, answer, mark) : ""),
    svg: () => svgFile(<SweepFile stack={stack} swept={swept} />),
  };
}

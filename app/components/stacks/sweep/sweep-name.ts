import { answerOf } from "#app/lib/stack-sweep/answers.ts";
import { inSentence } from "#app/lib/stack-sweep/in-sentence.ts";
import type { SweptView } from "#app/schemas/stack-sweep.ts";

/** What a sweep shows, as the name of its drawing: 'Warp against silicon thickness and temperature, free wafer'. */
export function sweepName({ answer, temperature, drawn }: SweptView): string {
  const axes = drawn.kind === "map" ? [drawn.x, drawn.y] : [drawn.x];
  const over = axes.map(({ label }) => inSentence(label)).join(" and ");
  const at = axes.some(({ dimension }) => dimension === "temperature") ? "" : `, ${temperature}`;
  return `${answerOf(answer)?.label ?? ""} ${drawn.kind === "map" ? "over" : "against"} ${over}, free wafer${at}`;
}

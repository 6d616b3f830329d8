import { ChartFigure } from "#app/components/charts/ChartFigure.tsx";
import { answerOf } from "#app/lib/stack-sweep/answers.ts";
import type { SweptView } from "#app/schemas/stack-sweep.ts";
import { SweepMap } from "./SweepMap.tsx";
import { sweepName } from "./sweep-name.ts";
import { sweepPlot } from "./sweep-plot.ts";

/** What a sweep found as a curve or a map that can be read. */
export function SweepDrawn({ swept }: { swept: SweptView }) {
  const answer = answerOf(swept.answer);
  const { drawn } = swept;
  if (!answer) return null;
  if (drawn.kind === "map") return <SweepMap map={drawn} answer={answer} label={sweepName(swept)} />;
  if (drawn.points.length < 2)
    return <p className="text-quiet">There is nothing to draw in this range: {answer.none}.</p>;
  return (
    <ChartFigure
      plot={sweepPlot(drawn, answer)}
      label={sweepName(swept)}
      summary="Filled dot: the stack as it is. Shaded: curled about one axis. Gravity is left out."
      xName={drawn.x.label}
    />
  );
}

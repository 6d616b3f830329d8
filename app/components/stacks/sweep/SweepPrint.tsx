import { PLANE_WIDE } from "#app/components/drawings/plane.ts";
import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import { answerOf } from "#app/lib/stack-sweep/answers.ts";
import type { SweptView } from "#app/schemas/stack-sweep.ts";
import { MapPlot } from "./MapPlot.tsx";
import { sweepName } from "./sweep-name.ts";
import { sweepPlot } from "./sweep-plot.ts";

interface Props {
  swept: SweptView;
  /** px */
  width: number;
  height: number;
}

/** The drawing of a sweep as it prints. */
export function SweepPrint({ swept, width, height }: Props) {
  const answer = answerOf(swept.answer);
  const { drawn } = swept;
  if (!answer) return null;
  const label = sweepName(swept);
  if (drawn.kind === "curve")
    return <PrintPlot plot={sweepPlot(drawn, answer)} label={label} width={width} height={height} textSize={11} />;
  return (
    <MapPlot map={drawn} answer={answer} label={label} size={{ ...PLANE_WIDE, width, height, text: 12, ticks: 8 }} />
  );
}

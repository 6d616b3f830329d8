import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import type { Plot } from "#app/components/drawings/plot.ts";
import type { ComparedMember } from "#app/schemas/comparison.ts";
import { PlotKey } from "./PlotKey.tsx";

interface Props {
  /** what the chart shows */
  name: string;
  plot: Plot;
  members: readonly ComparedMember[];
}

const WIDTH = 800;
const PLOT = 480;
const HEAD = 34;
const ROW = 20;

/** The chart as a drawing that stands by itself: what it shows above it, the whole names of its lines below. */
export function ComparisonFile({ name, plot, members }: Props) {
  const height = HEAD + PLOT + ROW * (members.length + 1);
  return (
    <svg
      xmlns="http://www.w3.org/2000/svg"
      width={WIDTH}
      height={height}
      viewBox={`0 0 ${WIDTH} ${height}`}
      fontFamily="'Noto Sans', Arial, sans-serif"
      fontSize="12.5"
    >
      <title>{name}</title>
      <rect width={WIDTH} height={height} fill="#ffffff" />
      <text x="12" y="22" fontWeight="600" fontSize="14">
        {name}
      </text>
      <svg y={HEAD} width={WIDTH} height={PLOT}>
        <PrintPlot plot={plot} label={name} width={WIDTH} height={PLOT} />
      </svg>
      {members.map(({ letter, name: member, program }, n) => (
        <g key={letter} transform={`translate(12 ${HEAD + PLOT + ROW * (n + 1)})`}>
          <PlotKey plot={plot} letter={letter} />
          <text x="52" y="4">{`${letter}  ${member} (${program})`}</text>
        </g>
      ))}
    </svg>
  );
}

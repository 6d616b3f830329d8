import { colour } from "#app/components/drawings/colour.ts";
import { plannedRowsHeight } from "#app/components/drawings/planned-spans.ts";
import { StripPlan } from "#app/components/drawings/StripScales.tsx";
import type { StripStep } from "#app/components/drawings/strip-step.ts";
import { SupportPlanned } from "#app/components/drawings/SupportPlanned.tsx";
import { OwnHead } from "#app/components/units/OwnFigure.tsx";

/** One step as far as it can be drawn before anything is computed. */
export type PlannedStep = Pick<StripStep, "number" | "name" | "shortName" | "silicon" | "temperature" | "planned">;

const FULL = 1392;
const LEFT = 136;
const RIGHT = 24;
const NARROWEST_COLUMN = 48;
const HEADS: readonly [y: number, head: string, under?: string][] = [
  [78, "Silicon", "µm, to scale"],
  [136, "Temperature", "°C, at the step"],
  [200, "Support planned"],
];

/** A flow as it is planned, on one axis: silicon to scale, temperature, what holds the wafer. The step table says the same. */
export function FlowPlan({ steps }: { steps: readonly PlannedStep[] }) {
  const columnWidth = Math.max(NARROWEST_COLUMN, (FULL - LEFT - RIGHT) / Math.max(1, steps.length));
  const right = LEFT + columnWidth * steps.length;
  const width = right + RIGHT;
  const planned = steps.map((step) => step.planned);
  const height = 222 + plannedRowsHeight(planned, columnWidth, 12.5);
  const ticks = steps.slice(1).map((_, index) => `M${LEFT + (index + 1) * columnWidth} 0V24`);
  return (
    <div className="overflow-x-auto max-tablet:hidden" role="region" aria-label="The plan, drawn" tabIndex={0}>
      <svg
        className="block h-auto w-full max-wide:w-(--strip-width) print:w-full"
        style={{ ["--strip-width" as string]: `${width}px`, minWidth: width > FULL ? width : undefined }}
        viewBox={`0 0 ${width} ${height}`}
        role="img"
        aria-label={`${steps.length} steps: silicon, temperature and planned support, as in the table below`}
      >
        <text x="24" y="17" style={{ fill: colour("quiet") }}>
          Step
        </text>
        {HEADS.map(([y, head, under]) => (
          <g key={head}>
            <text x="24" y={y} style={{ fontWeight: 600 }}>
              {head}
            </text>
            {under && (
              <text x="24" y={y + 17} style={{ fill: colour("quiet") }}>
                <OwnHead unit={under} />
              </text>
            )}
          </g>
        ))}
        <path d={`M${LEFT + 0.5} 0V${height}M${right + 0.5} 0V${height}`} stroke={colour("line")} />
        <path d={`${ticks.join("")}M0 24.5H${width}`} stroke={colour("ink")} />
        <StripPlan steps={steps} columns={{ left: LEFT, width: columnWidth }} />
        <SupportPlanned planned={planned} x={LEFT} y={196} columnWidth={columnWidth} />
      </svg>
    </div>
  );
}

import type { Outcome } from "#app/engine/vocabulary.ts";
import { BowFigure } from "./BowFigure.tsx";
import { colour, type ColourToken } from "./colour.ts";
import { plannedRowsHeight } from "./planned-spans.ts";
import { selectInPlace } from "./select-in-place.ts";
import { HATCH_STYLES, OUTCOME_SIGNS } from "./severity.ts";
import { StripScales } from "./StripScales.tsx";
import type { StripStep } from "./strip-step.ts";
import { SupportPlanned } from "./SupportPlanned.tsx";
import { SupportRequired } from "./SupportRequired.tsx";
import { OwnHead } from "#app/components/units/OwnFigure.tsx";

export interface StepStripProps {
  steps: readonly StripStep[];
  /** Wafer diameter, m. */
  diameter: number;
  /** The page's exaggeration, from chooseExaggeration. */
  exaggeration: number;
  /** Name of the scrolling region. */
  label: string;
  /** Selects a step by its number in place of following its link. */
  onSelect?: (step: number) => void;
}

const FULL_WIDTH = 1392;
const LEFT = 124;
const RIGHT = 68;
const NARROWEST_COLUMN = 48;
const SUPPORT_Y = 362;
const PLANNED_Y = 417;

/**
 * All steps of a flow on one axis: silicon to scale, temperature, bow line, warp against the tool's own limit, support
 * needed and planned. Columns are (1392 − 124 − 68)/n px wide, at least 48; what does not fit scrolls inside the region,
 * which takes the keyboard's focus for that.
 */
export function StepStrip({ steps, diameter, exaggeration, label, onSelect }: StepStripProps) {
  const columnWidth = Math.max(NARROWEST_COLUMN, (FULL_WIDTH - LEFT - RIGHT) / Math.max(1, steps.length));
  const width = LEFT + RIGHT + columnWidth * steps.length;
  const planned = steps.map((step) => step.planned);
  const height = 444 + plannedRowsHeight(planned, columnWidth, 12.5);
  const columns = { left: LEFT, width: columnWidth };
  const at = (index: number) => LEFT + index * columnWidth;
  return (
    <div className="overflow-x-auto" role="region" aria-label={label} tabIndex={0}>
      <svg
        className="block h-auto w-full max-wide:w-(--strip-width) print:w-full"
        style={{ ["--strip-width" as string]: `${width}px`, minWidth: width > FULL_WIDTH ? width : undefined }}
        viewBox={`0 0 ${width} ${height}`}
        role="group"
        aria-label={`${steps.length} steps`}
      >
        {steps.map((step, index) => (
          <StepColumn key={step.number} step={step} x={at(index)} width={columnWidth} onSelect={onSelect} />
        ))}
        <g aria-hidden="true" pointerEvents="none">
          <Frame steps={steps.length} columns={columns} width={width} height={height} />
          <Heads exaggeration={exaggeration} />
          <StripScales steps={steps} columns={columns} />
          {steps.map((step, index) => (
            <BowFigure
              key={step.number}
              x={at(index)}
              y={176}
              width={columnWidth}
              height={70}
              margin={columnWidth > 60 ? 9 : 5}
              diameter={diameter}
              {...step.bow}
              exaggeration={step.bow.exaggeration ?? exaggeration}
              showScale={step.bow.shape.kind === "rolled" || step.bow.exaggeration !== undefined}
            />
          ))}
          <SupportRequired
            required={steps.map((step) => step.required)}
            outcomes={steps.map((step) => step.outcome)}
            x={LEFT}
            y={SUPPORT_Y}
            columnWidth={columnWidth}
            height={32}
          />
          <SupportPlanned planned={planned} x={LEFT} y={PLANNED_Y} columnWidth={columnWidth} />
          {steps.map((step, index) =>
            step.selected ? (
              <path
                key={step.number}
                d={`M${at(index) + 0.5} 0V${SUPPORT_Y}M${at(index + 1) + 0.5} 0V${SUPPORT_Y}`}
                stroke={colour(edgeColour(step.outcome))}
              />
            ) : null,
          )}
        </g>
      </svg>
    </div>
  );
}

/** Ink where nothing is wrong, otherwise the colour of the outcome. */
function edgeColour(outcome: Outcome): ColourToken {
  return outcome === "clear" ? "ink" : HATCH_STYLES[OUTCOME_SIGNS[outcome].level].colour;
}

/** The whole column is the link; its words are the accessible name, the drawing over it is hidden. */
function StepColumn(props: { step: StripStep; x: number; width: number; onSelect: StepStripProps["onSelect"] }) {
  const { step, x, width, onSelect } = props;
  const outcome = OUTCOME_SIGNS[step.outcome].word.toLowerCase();
  const content = (
    <>
      <rect
        className="hover-mark"
        x={x}
        y="0"
        width={width}
        height={SUPPORT_Y}
        fill={step.selected ? colour("wash") : "transparent"}
      />
      <rect className="focus-mark" x={x + 2} y="2" width={width - 4} height={SUPPORT_Y + 29} />
    </>
  );
  if (step.href === undefined) return <g aria-hidden="true">{content}</g>;
  return (
    <a
      className="drawing-link"
      href={step.href}
      aria-label={`Step ${step.number}, ${step.name}: ${outcome}`}
      aria-current={step.selected ? "step" : undefined}
      onClick={selectInPlace(onSelect && (() => onSelect(step.number)))}
    >
      {content}
    </a>
  );
}

interface FrameProps {
  steps: number;
  columns: { left: number; width: number };
  width: number;
  height: number;
}

/** Zone marks as on the edge of a drawing sheet: ink ticks the full height of the head, columns closed left and right. */
function Frame({ steps, columns, width, height }: FrameProps) {
  const ends = [columns.left, columns.left + steps * columns.width];
  const ticks = Array.from(
    { length: Math.max(0, steps - 1) },
    (_, index) => columns.left + (index + 1) * columns.width,
  );
  return (
    <>
      <path d={ends.map((x) => `M${x + 0.5} 0V${height}`).join("")} stroke={colour("line")} />
      <path d={`${ticks.map((x) => `M${x + 0.5} 0V24`).join("")}M0 24.5H${width}`} stroke={colour("ink")} />
    </>
  );
}

function Heads({ exaggeration }: { exaggeration: number }) {
  const heads: readonly [y: number, head: string, under?: string][] = [
    [78, "Silicon", "µm, to scale"],
    [136, "Temperature", "°C, at the step"],
    [196, "Bow line", `as it lies, ×${exaggeration}`],
    [284, "Warp", "% of tool’s limit"],
    [382, "Support needed"],
    [421, "Support planned"],
  ];
  return (
    <>
      <text x="16" y="17" style={{ fill: colour("quiet") }}>
        Step
      </text>
      {heads.map(([y, head, under]) => (
        <g key={head}>
          <text x="16" y={y} style={{ fontWeight: 600 }}>
            {head}
          </text>
          {under === undefined ? null : (
            <text x="16" y={y + 17} style={{ fill: colour("quiet") }}>
              <OwnHead unit={under} />
            </text>
          )}
        </g>
      ))}
    </>
  );
}

import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import type { StripStep } from "./strip-step.ts";
import { textWidth } from "./text-width.ts";
import { wrapText } from "./wrap-text.ts";
import { OwnFigure } from "#app/components/units/OwnFigure.tsx";

export interface StripScalesProps {
  steps: readonly StripStep[];
  columns: { left: number; width: number };
}

/** 25 °C: a step at or below it lies on the base of the temperature row. */
const ROOM_TEMPERATURE = 298.15;
/** The row always reaches at least this high, so that a flow that stays cool looks cool. */
const LEAST_TOP = 473.15;
/** 68 px are 100 % of the tool's limit; marks end at 120 %, the figure says how far it really is. */
const WARP = { base: 346, full: 68, cap: 1.2 };

/** The rows of a step strip that have a scale: numbers and names, silicon, temperature and warp. */
export function StripScales({ steps, columns }: StripScalesProps) {
  return (
    <>
      <StripPlan steps={steps} columns={columns} />
      <Warp steps={steps} columns={columns} />
    </>
  );
}

/** What the rows that need no result draw from. */
interface PlanRowProps {
  steps: readonly Pick<StripStep, "number" | "shortName" | "selected" | "silicon" | "temperature">[];
  columns: StripScalesProps["columns"];
}

/** The rows that a flow has before anything is computed: numbers and names, silicon, temperature. */
export function StripPlan(props: PlanRowProps) {
  return (
    <>
      <Names {...props} />
      <Silicon {...props} />
      <Temperature {...props} />
    </>
  );
}

function Names({ steps, columns }: PlanRowProps) {
  return steps.map((step, index) => {
    const middle = columns.left + (index + 0.5) * columns.width;
    const weight = step.selected ? 600 : 400;
    const lines = wrapText(step.shortName, columns.width - 4, 12.5, 2, step.selected);
    return (
      <g key={step.number} style={{ fontWeight: weight }}>
        <text x={middle} y="17" textAnchor="middle">
          {step.number}
        </text>
        {lines.map((line, row) => (
          <text key={row} x={middle} y={(lines.length === 1 ? 45 : 40) + row * 14} textAnchor="middle">
            {line}
          </text>
        ))}
      </g>
    );
  });
}

function Silicon({ steps, columns }: PlanRowProps) {
  const thickest = Math.max(...steps.map((step) => step.silicon.thickness));
  const at = (index: number) => columns.left + index * columns.width;
  const height = (thickness: number) => 102 - (thickness / thickest) * 38;
  const outline = steps
    .map((step, index) => `V${coordinate(height(step.silicon.thickness))}H${coordinate(at(index + 1))}`)
    .join("");
  const first = steps[0];
  if (first === undefined) return null;
  const top = `M${at(0)} ${coordinate(height(first.silicon.thickness))}`;
  return (
    <>
      <path d={`M${at(0)} 102${outline}V102Z`} fill={colour("siwash")} />
      <path d={top + outline} fill="none" stroke={colour("silicon")} strokeWidth="1.5" />
      {steps.map((step, index) => {
        if (index > 0 && steps[index - 1]?.silicon.text === step.silicon.text) return null;
        const y = height(step.silicon.thickness);
        return (
          <text key={step.number} x={at(index) + 8} y={coordinate(102 - y >= 18 ? y + 15 : y - 6)}>
            <OwnFigure unit="µm">{step.silicon.text}</OwnFigure>
          </text>
        );
      })}
    </>
  );
}

function Temperature({ steps, columns }: PlanRowProps) {
  const hottest = Math.max(LEAST_TOP, ...steps.map((step) => step.temperature.peak));
  const height = (kelvin: number) => 162 - ((kelvin - ROOM_TEMPERATURE) / (hottest - ROOM_TEMPERATURE)) * 34;
  const inset = Math.min(14, columns.width * 0.19);
  const right = columns.left + steps.length * columns.width;
  return (
    <>
      <path d={`M${columns.left} 162.5H${right}`} stroke={colour("line")} />
      {steps.map((step, index) => {
        const from = columns.left + index * columns.width + inset;
        const to = columns.left + (index + 1) * columns.width - inset;
        // Within 5 K of room temperature a plateau would only smear the base line.
        const warm = step.temperature.peak > ROOM_TEMPERATURE + 5;
        const y = coordinate(warm ? height(step.temperature.peak) : 162);
        return (
          <g key={step.number}>
            {warm ? (
              <path
                d={`M${coordinate(from + 0.5)} 162V${y}M${coordinate(to - 0.5)} 162V${y}`}
                stroke={colour("edge")}
                strokeWidth="0.75"
              />
            ) : null}
            <path d={`M${coordinate(from)} ${y}H${coordinate(to)}`} stroke={colour("ink")} strokeWidth="1.5" />
            {warm ? (
              <text x={coordinate((from + to) / 2)} y={coordinate(Number(y) - 5)} textAnchor="middle">
                <OwnFigure unit="°C">{step.temperature.text}</OwnFigure>
              </text>
            ) : null}
          </g>
        );
      })}
    </>
  );
}

function Warp({ steps, columns }: StripScalesProps) {
  const height = (fraction: number) => WARP.base - Math.min(Math.max(fraction, 0), WARP.cap) * WARP.full;
  const right = columns.left + steps.length * columns.width;
  const limit = height(1);
  return (
    <>
      <path
        d={`M${columns.left} ${WARP.base + 0.5}H${right}M${columns.left} ${height(0.5)}H${right}`}
        stroke={colour("line")}
      />
      <path d={`M${columns.left} ${limit}H${right}`} stroke={colour("stop")} strokeDasharray="6 3" />
      <text x={right + 8} y={limit + 4} style={{ fill: colour("stop") }}>
        100 %
      </text>
      <text x={right + 8} y={height(0.5) + 4} style={{ fill: colour("quiet") }}>
        50
      </text>
      <text x={right + 8} y={WARP.base + 4} style={{ fill: colour("quiet") }}>
        0
      </text>
      {steps.map((step, index) => {
        if (step.warp === null) return null;
        const { fraction, uncertainty } = step.warp;
        const over = fraction > 1;
        const middle = columns.left + (index + 0.5) * columns.width;
        const y = height(fraction);
        const paint = colour(over ? "stop" : "silicon");
        const text = String(Math.round(fraction * 100));
        // A figure that does not fit beside its mark stands above it.
        const beside = textWidth(text, 12.5, over) + 13 <= columns.width / 2;
        const nearLimit = Math.abs(fraction - 1) < 0.12;
        return (
          <g key={step.number}>
            <path
              d={`M${coordinate(middle)} ${coordinate(height(fraction - uncertainty))}V${coordinate(height(fraction + uncertainty))}`}
              stroke={paint}
              strokeWidth="8"
              strokeOpacity="0.3"
            />
            <path d={`M${coordinate(middle - 6)} ${coordinate(y)}h12`} stroke={paint} strokeWidth="2" />
            {fraction > WARP.cap ? (
              <path d={`M${coordinate(middle - 5)} ${coordinate(y - 3)}l5 -7l5 7z`} fill={paint} />
            ) : null}
            <text
              x={coordinate(beside ? middle + 11 : middle)}
              y={coordinate(beside ? y + (nearLimit ? -4 : 4) : y - 6)}
              textAnchor={beside ? "start" : "middle"}
              style={{ fontWeight: over ? 600 : 400 }}
            >
              {text}
            </text>
          </g>
        );
      })}
    </>
  );
}

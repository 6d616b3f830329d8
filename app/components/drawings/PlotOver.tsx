import type { CSSProperties } from "react";
import { alongLabel } from "./along-label.ts";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { limitLabels } from "./limit-labels.ts";
import { limitsInList } from "./limits-in-list.ts";
import type { Plot, PlotFrame, PlotScales } from "./plot.ts";
import { PlotMarker } from "./PlotMarker.tsx";
import { PlotMarks } from "./PlotMarks.tsx";
import { seriesValue } from "./series-value.ts";
import { spreadLabels } from "./spread-labels.ts";
import { textWidth } from "./text-width.ts";

export interface PlotOverProps {
  plot: Plot;
  frame: PlotFrame;
  scales: PlotScales;
  textSize: number;
  /** Series are named in a list below instead of at their ends, and so are limits where they are many. */
  withoutEndLabels?: boolean;
}

/** Label pitch at the line ends, as a multiple of the text size: 18 px at 12.5. */
const END_PITCH = 1.44;

/** A line that ends more than this before the right edge ends early, px. */
const EARLY = 40;

/** What lies over a plot's lines: minor ticks, limits, the regime's edge, markers, the chosen value and all labels. */
export function PlotOver(props: PlotOverProps) {
  const { plot, frame, scales, textSize, withoutEndLabels = false } = props;
  const inFrame = (x: number, y: number) =>
    x >= frame.left - 0.5 && x <= frame.right + 0.5 && y >= frame.top - 0.5 && y <= frame.bottom + 0.5;
  return (
    <>
      {plot.y.minor?.map((value) => (
        <path key={value} d={`M${frame.left} ${coordinate(scales.y(value))}h4`} stroke={colour("ink")} />
      ))}
      {plot.series.map((series) =>
        series.markersAt?.map((value) => {
          const at = seriesValue(plot, series, value);
          if (at === null) return null;
          const [x, y] = [scales.x(value), scales.y(at)];
          return inFrame(x, y) ? (
            <PlotMarker
              key={`${series.id} ${value}`}
              marker={series.marker}
              x={x}
              y={y}
              colourToken={series.colourToken}
            />
          ) : null;
        }),
      )}
      <XLimits {...props} />
      <YLimits {...props} />
      <Regime {...props} />
      <Shaded {...props} />
      {withoutEndLabels ? null : <Along {...props} />}
      <PlotMarks plot={plot} frame={frame} scales={scales} textSize={textSize} />
      <Chosen {...props} />
      {withoutEndLabels ? null : <EndLabels plot={plot} frame={frame} scales={scales} textSize={textSize} />}
    </>
  );
}

/** Words over curves keep a rim in the colour of the ground they stand on. */
function halo({ plot, scales }: PlotOverProps, middle: number): CSSProperties {
  const onRegime = plot.regime !== undefined && middle < scales.x(plot.regime.upTo);
  return {
    paintOrder: "stroke",
    stroke: colour(onRegime ? "wash" : "raised"),
    strokeWidth: 3,
    strokeLinejoin: "round",
  };
}

/** Places of all vertical lines but the limits, px. */
function otherVerticals({ plot, scales }: PlotOverProps): number[] {
  return [...(plot.regime ? [scales.x(plot.regime.upTo)] : []), ...(plot.chosen ? [scales.x(plot.chosen.x)] : [])];
}

function XLimits(props: PlotOverProps) {
  const { plot, frame, scales, textSize } = props;
  const inList = props.withoutEndLabels && limitsInList(plot);
  const limits = [...(plot.xLimits ?? [])]
    .sort((a, b) => a.value - b.value)
    .filter((limit) => scales.x(limit.value) > frame.left + 1 && scales.x(limit.value) < frame.right - 1);
  const lines = limits.map((limit) => scales.x(limit.value));
  const widths = limits.map((limit) => Math.max(...limit.lines.map((line) => textWidth(line, textSize))));
  const places = limitLabels(lines, widths, otherVerticals(props), frame);
  const lineHeight = textSize * 1.2;
  // All lines before all words: a line must not run through the words of another.
  const drawn = limits.map((limit, index) => (
    <path
      key={limit.value}
      d={`M${coordinate(lines[index] ?? 0)} ${frame.top}V${frame.bottom}`}
      stroke={colour("ink")}
      strokeDasharray="2 3"
    />
  ));
  const words = limits.map((limit, index) => {
    const place = places[index] ?? { x: 0, anchor: "start", tier: 0 };
    const tiers = place.tier * (limit.lines.length * lineHeight + 4);
    const last =
      plot.xLimitWords === "top"
        ? frame.top + textSize + 4 + tiers + (limit.lines.length - 1) * lineHeight
        : frame.bottom - 11 - tiers;
    return (
      <g key={limit.value}>
        {limit.lines.map((line, row) => (
          <text
            key={line}
            x={coordinate(place.x)}
            y={coordinate(last - (limit.lines.length - 1 - row) * lineHeight)}
            textAnchor={place.anchor}
            style={{
              ...halo(props, place.x + ((place.anchor === "end" ? -1 : 1) * (widths[index] ?? 0)) / 2),
              fontSize: textSize,
              fill: row === 0 ? undefined : colour("quiet"),
            }}
          >
            {line}
          </text>
        ))}
      </g>
    );
  });
  return (
    <>
      {drawn}
      {inList ? null : words}
    </>
  );
}

function YLimits(props: PlotOverProps) {
  const { plot, frame, scales, textSize } = props;
  const inList = props.withoutEndLabels && limitsInList(plot);
  return plot.yLimits?.map((limit) => {
    const y = scales.y(limit.value);
    if (y < frame.top || y > frame.bottom) return null;
    const below = y + textSize * 1.2 < frame.bottom - 6;
    return (
      <g key={limit.value}>
        <path d={`M${frame.left} ${coordinate(y)}H${frame.right}`} stroke={colour("stop")} strokeDasharray="6 3" />
        {inList ? null : (
          <text
            x={frame.left + 6}
            y={coordinate(below ? y + textSize * 1.2 : y - 5)}
            style={{ ...halo(props, frame.left + 20), fontSize: textSize, fill: colour("stop") }}
          >
            {limit.lines.join(" ")}
          </text>
        )}
      </g>
    );
  });
}

function Regime(props: PlotOverProps) {
  const { plot, frame, scales, textSize, withoutEndLabels } = props;
  if (!plot.regime) return null;
  const x = scales.x(plot.regime.upTo);
  if (x <= frame.left || x >= frame.right) return null;
  const y = frame.top + textSize * 1.12;
  const insideFits = textWidth(plot.regime.inside, textSize) + 12 <= x - frame.left;
  // The margin of the end labels is free at the top; without them there is none.
  const room = frame.right + (withoutEndLabels ? 0 : 60) - x;
  const rightFits = textWidth(plot.regime.label, textSize, true) + 6 <= room;
  return (
    <>
      <path d={`M${coordinate(x)} ${frame.top}V${frame.bottom}`} stroke={colour("ink")} />
      <text
        x={coordinate(x + (rightFits ? 6 : -6))}
        y={coordinate(y)}
        textAnchor={rightFits ? "start" : "end"}
        style={{ ...halo(props, x + (rightFits ? 6 : -6)), fontSize: textSize, fontWeight: 600 }}
      >
        {plot.regime.label}
      </text>
      {insideFits && rightFits ? (
        <text
          x={coordinate(x - 6)}
          y={coordinate(y)}
          textAnchor="end"
          style={{ ...halo(props, x - 6), fontSize: textSize, fill: colour("quiet") }}
        >
          {plot.regime.inside}
        </text>
      ) : null}
    </>
  );
}

function Shaded(props: PlotOverProps) {
  const { plot, frame, scales, textSize } = props;
  return plot.shaded?.map(({ from, to, label }) => {
    const [left, right] = [scales.x(from), scales.x(to)];
    const edges = [left, right].filter((edge) => edge > frame.left + 0.5 && edge < frame.right - 0.5);
    const fits = textWidth(label, textSize) + 12 <= Math.min(right, frame.right) - Math.max(left, frame.left);
    return (
      <g key={from}>
        <path
          d={edges.map((edge) => `M${coordinate(edge)} ${frame.top}V${frame.bottom}`).join("")}
          stroke={colour("ink")}
        />
        {fits ? (
          <text
            x={coordinate(Math.max(left, frame.left) + 6)}
            y={coordinate(frame.top + textSize * 1.12)}
            style={{
              fontSize: textSize,
              fill: colour("quiet"),
              paintOrder: "stroke",
              stroke: colour("wash"),
              strokeWidth: 3,
            }}
          >
            {label}
          </text>
        ) : null}
      </g>
    );
  });
}

function Along(props: PlotOverProps) {
  const { plot, frame, scales, textSize } = props;
  const verticals = [...otherVerticals(props), ...(plot.xLimits ?? []).map((limit) => scales.x(limit.value))];
  return plot.series.map((series) => {
    if (series.labelled !== "along") return null;
    const place = alongLabel(plot, series, scales, frame, textWidth(series.label, textSize), verticals);
    return place ? (
      <text
        key={series.id}
        x={coordinate(place.x)}
        y={coordinate(place.y)}
        textAnchor={place.anchor}
        style={{ ...halo(props, place.x), fontSize: textSize, fill: colour("quiet") }}
      >
        {series.label}
      </text>
    ) : null;
  });
}

function Chosen({ plot, frame, scales }: PlotOverProps) {
  if (!plot.chosen) return null;
  const x = coordinate(scales.x(plot.chosen.x));
  const y = scales.y(plot.chosen.y);
  const seen = y >= frame.top && y <= frame.bottom;
  return (
    <>
      <path
        d={`M${x} ${coordinate(Math.min(frame.bottom, Math.max(frame.top, y)))}V${frame.bottom}`}
        stroke={colour("silicon")}
      />
      {seen ? <circle cx={x} cy={coordinate(y)} r="5" fill={colour("silicon")} /> : null}
      <path d={`M${x} ${frame.bottom}l-4 8h8z`} fill={colour("silicon")} />
    </>
  );
}

function EndLabels({ plot, frame, scales, textSize }: PlotOverProps) {
  const ends = plot.series
    .flatMap((series) => {
      const last = series.points.at(-1);
      if (last === undefined || (series.labelled ?? "end") !== "end") return [];
      const y = Math.min(frame.bottom, Math.max(frame.top, scales.y(last.y)));
      return [{ series, x: Math.min(frame.right, scales.x(last.x)), y }];
    })
    .sort((a, b) => a.y - b.y);
  const places = spreadLabels(
    ends.map((end) => end.y),
    ends.map(() => textSize * END_PITCH),
    frame.top,
    frame.bottom + textSize,
  );
  return ends.map(({ series, x, y }, index) => {
    const place = places[index] ?? y;
    // A line that ends early has its label at its end: a leader to the edge would read as more of the line.
    const from = frame.right - x > EARLY ? x + 6 : frame.right + 10;
    return (
      <g key={series.id}>
        <path
          d={`M${coordinate(x)} ${coordinate(y)}L${coordinate(from)} ${coordinate(place)}`}
          stroke={colour(series.colourToken)}
        />
        <text
          x={coordinate(from + 4)}
          y={coordinate(place + textSize * 0.36)}
          style={{
            ...halo({ plot, frame, scales, textSize }, from),
            fontSize: textSize,
            fontWeight: 600,
            fill: colour(series.colourToken),
          }}
        >
          {series.endLabel ?? series.label}
        </text>
      </g>
    );
  });
}

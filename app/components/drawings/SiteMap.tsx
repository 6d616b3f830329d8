import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { OwnFigure, OwnHead, useOwnText } from "#app/components/units/OwnFigure.tsx";

interface Site {
  /** from the wafer's centre, m */
  x: number;
  y: number;
  value: number;
}

interface Props {
  sites: readonly Site[];
  /** of the wafer, m */
  radius: number;
  /** what the drawing shows, in words */
  label: string;
  /** what the legend counts in, and how it writes a value */
  unit: string;
  format: (value: number) => string;
}

const CLASSES = 5;
const BOX = { side: 220, legend: 130 };
const ROW = 20;
const WAFER = 100;

/**
 * Values of sites on a wafer, x to the right and y upwards, in classes of equal width. A class is told by the size of its dot as well as by its shade, so
 * that a grey print reads the same.
 */
export function SiteMap({ sites, radius, label, unit, format }: Props) {
  const own = useOwnText();
  const values = sites.map(({ value }) => value);
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const step = (most - least) / CLASSES;
  const classOf = (value: number) => (step === 0 ? 0 : Math.min(CLASSES - 1, Math.floor((value - least) / step)));
  const reach = Math.max(radius, ...sites.map(({ x, y }) => Math.hypot(x, y)));
  const centre = BOX.side / 2;
  const at = (metres: number) => (metres / reach) * WAFER;
  const shown = step === 0 ? [0] : Array.from({ length: CLASSES }, (_, n) => CLASSES - 1 - n);
  return (
    <svg
      viewBox={`0 0 ${BOX.side + BOX.legend} ${BOX.side}`}
      role="img"
      aria-label={own(label)}
      className="block w-full max-w-90 text-label"
    >
      <circle cx={centre} cy={centre} r={WAFER} fill={colour("raised")} stroke={colour("silicon")} strokeWidth={1.2} />
      {sites.map(({ x, y, value }, n) => (
        <Dot key={n} x={centre + at(x)} y={centre - at(y)} level={classOf(value)} />
      ))}
      <text x={BOX.side + 6} y={24} fill={colour("quiet")}>
        <OwnHead unit={unit} />
      </text>
      {shown.map((level, row) => (
        <g key={level}>
          <Dot x={BOX.side + 12} y={42 + ROW * row} level={level} />
          <text x={BOX.side + 24} y={46 + ROW * row} fill={colour("ink")}>
            <OwnFigure unit={unit}>
              {step === 0 ? format(least) : `${format(least + level * step)} to ${format(least + (level + 1) * step)}`}
            </OwnFigure>
          </text>
        </g>
      ))}
    </svg>
  );
}

function Dot({ x, y, level }: { x: number; y: number; level: number }) {
  return (
    <circle
      cx={coordinate(x)}
      cy={coordinate(y)}
      r={coordinate(1.6 + 0.9 * level)}
      fill={colour("silicon")}
      fillOpacity={0.35 + 0.65 * (level / (CLASSES - 1))}
      stroke={colour("silicon")}
      strokeWidth={0.6}
    />
  );
}

import { formatQuantity } from "#app/engine/units/format.ts";
import type { MapView } from "#app/schemas/film-analysis.ts";
import { colour } from "./colour.ts";
import { heightShade } from "./height-shade.ts";
import { useOwnText } from "#app/components/units/OwnFigure.tsx";

const BAR = { width: 22, height: 200, top: 12 } as const;
const MOST_TEXTS = 7;

const um = (metres: number) => formatQuantity(metres, "length", { unit: "µm", significant: 3, sign: true, trim: true });

/** The heights that the shades of a map stand for, and how far apart its lines are. */
export function MapLegend({ map }: { map: Pick<MapView, "low" | "high" | "step" | "bands" | "levels"> }) {
  const own = useOwnText();
  const { low, high, step, bands, levels } = map;
  const y = (height: number) => BAR.top + BAR.height * (1 - (height - low) / (high - low || 1));
  const inside = (height: number) => Math.min(high, Math.max(low, height));
  const every = Math.max(1, Math.ceil(levels.length / MOST_TEXTS));
  return (
    <div className="text-label">
      <p className="text-quiet">Height over the fitted plane</p>
      <svg width="120" height={BAR.height + 2 * BAR.top} role="img" aria-label={own(`From ${um(low)} to ${um(high)}`)}>
        {bands.map(({ height }) => {
          const [top, bottom] = [y(inside(height + step / 2)), y(inside(height - step / 2))];
          return (
            <rect
              key={height}
              x="1"
              y={top}
              width={BAR.width}
              height={Math.max(0, bottom - top)}
              {...heightShade(map, height)}
            />
          );
        })}
        <rect x="1" y={BAR.top} width={BAR.width} height={BAR.height} fill="none" stroke={colour("ink")} />
        {levels.map(({ height }, n) => (
          <g key={height}>
            <path d={`M${BAR.width + 1} ${y(height)}h5`} stroke={colour("ink")} />
            {n % every === 0 && (
              <text x={BAR.width + 11} y={y(height) + 4}>
                {um(height)}
              </text>
            )}
          </g>
        ))}
      </svg>
      {step > 0 && <p>A line every {formatQuantity(step, "length", { significant: 2, trim: true })}.</p>}
    </div>
  );
}

import type { Outcome } from "#app/engine/vocabulary.ts";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";

/** A wafer of a lot; `share` is its warp over what the tool takes, null where there is none. */
export interface LotDot {
  slot: number;
  share: number | null;
  outcome: Outcome;
}

interface Props {
  dots: readonly LotDot[];
  /** slots of the cassette */
  slots: number;
  /** what the drawing shows, in words */
  label: string;
}

const BOX = { width: 640, height: 210, left: 52, right: 12, top: 12, bottom: 36 };
const PLOT = { width: BOX.width - BOX.left - BOX.right, height: BOX.height - BOX.top - BOX.bottom };
/** Shares beyond it are drawn at the top, as a triangle that points out of the drawing. */
const HIGHEST = 2;
const LEAST_TOP = 1.2;

/** The wafers of a lot by slot, each as a share of the limit that it comes nearest to. Marks differ by shape, not only by colour. */
export function LotDots({ dots, slots, label }: Props) {
  const shares = dots.flatMap(({ share }) => share ?? []);
  const top = Math.min(HIGHEST, Math.max(LEAST_TOP, ...shares.map((share) => Math.ceil(share * 10) / 10)));
  const x = (slot: number) => BOX.left + ((slot - 0.5) / slots) * PLOT.width;
  const y = (share: number) => BOX.top + (1 - Math.min(share, top) / top) * PLOT.height;
  const ticks = [0, 0.5, 1, 1.5, 2].filter((tick) => tick <= top);
  return (
    <svg width={BOX.width} height={BOX.height} role="img" aria-label={label} className="block text-label">
      {ticks.map((tick) => (
        <g key={tick}>
          <line
            x1={BOX.left}
            x2={BOX.width - BOX.right}
            y1={coordinate(y(tick))}
            y2={coordinate(y(tick))}
            stroke={colour(tick === 0 ? "ink" : tick === 1 ? "stop" : "line")}
            strokeDasharray={tick === 1 ? "6 3" : undefined}
          />
          <text x={BOX.left - 6} y={coordinate(y(tick) + 4)} textAnchor="end" fill={colour("quiet")}>
            {`${100 * tick}\u00A0%`}
          </text>
        </g>
      ))}
      <line x1={BOX.left} x2={BOX.left} y1={BOX.top} y2={BOX.top + PLOT.height} stroke={colour("ink")} />
      {Array.from({ length: slots }, (_, index) => index + 1)
        .filter((slot) => slot === 1 || slot % 5 === 0)
        .map((slot) => (
          <text
            key={slot}
            x={coordinate(x(slot))}
            y={BOX.top + PLOT.height + 15}
            textAnchor="middle"
            fill={colour("quiet")}
          >
            {slot}
          </text>
        ))}
      <text x={BOX.left + PLOT.width / 2} y={BOX.height - 5} textAnchor="middle" fill={colour("quiet")}>
        slot
      </text>
      {dots.map((dot) => (
        <Dot key={dot.slot} dot={dot} x={x(dot.slot)} y={y(dot.share ?? 0)} beyond={(dot.share ?? 0) > top} />
      ))}
    </svg>
  );
}

function Dot({ dot: { share, outcome }, x, y, beyond }: { dot: LotDot; x: number; y: number; beyond: boolean }) {
  const at = (dx: number, dy: number) => `${coordinate(x + dx)} ${coordinate(y + dy)}`;
  if (share === null)
    return (
      <text x={coordinate(x)} y={coordinate(y - 4)} textAnchor="middle" fill={colour("ink")} className="font-semibold">
        ?
      </text>
    );
  if (beyond) return <path d={`M${at(0, 0)} L${at(5, 9)} L${at(-5, 9)} Z`} fill={colour("stop")} />;
  if (outcome === "do not run")
    return <rect x={coordinate(x - 4)} y={coordinate(y - 4)} width={8} height={8} fill={colour("stop")} />;
  if (outcome === "clear") return <circle cx={coordinate(x)} cy={coordinate(y)} r={3.6} fill={colour("silicon")} />;
  return (
    <circle
      cx={coordinate(x)}
      cy={coordinate(y)}
      r={4}
      fill={colour("surface")}
      stroke={colour("caution")}
      strokeWidth={1.6}
    />
  );
}

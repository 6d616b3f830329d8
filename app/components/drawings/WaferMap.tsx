import { useId } from "react";
import type { MapView } from "#app/schemas/film-analysis.ts";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { heightShade } from "./height-shade.ts";
import { MapLegend } from "./MapLegend.tsx";
import { useOwnText } from "#app/components/units/OwnFigure.tsx";

export interface WaferMapProps {
  map: MapView;
  /** what it shows, in words */
  label: string;
  /** azimuths of the scans, rad from the notch */
  azimuths: readonly number[];
  /** angle of the axis of the larger curvature, rad from the notch; null where it is not told */
  axis: number | null;
}

/** The wafer's radius in the unit of the map's paths. */
const R = 1000;
const NOTCH = 26;
const MARGIN = 170;
const TEXT = 66;

/** Heavy line at every fifth level. */
const HEAVY = 5;

/**
 * Heights over a wafer seen on its device side, notch down: lines of equal height, shaded from low to high, the lines that were scanned
 * and the axis about which it bends least. Pure, the same on screen and paper.
 */
export function WaferMap({ map, label, azimuths, axis }: WaferMapProps) {
  const own = useOwnText();
  const size = 2 * (R + MARGIN);
  const id = useId();
  return (
    <div className="flex flex-wrap items-center gap-x-6 gap-y-3">
      <svg
        className="block h-auto w-full max-w-[420px] flex-1 basis-64"
        viewBox={`${-size / 2} ${-size / 2} ${size} ${size}`}
        role="img"
        aria-label={own(label)}
      >
        <clipPath id={id}>
          <circle r={coordinate((R * map.radius) / map.waferRadius)} />
        </clipPath>
        <g clipPath={`url(#${id})`} shapeRendering="crispEdges">
          {map.bands.map(({ height, path }) => (
            <path key={height} d={path} {...heightShade(map, height)} />
          ))}
        </g>
        {map.levels.map(({ height, path }) => (
          <path
            key={height}
            d={path}
            fill="none"
            stroke={colour("ink")}
            strokeWidth={Math.round(height / map.step) % HEAVY === 0 ? 8 : 3.5}
            strokeLinejoin="round"
          />
        ))}
        <path d={rim()} fill="none" stroke={colour("ink")} strokeWidth={6} />
        {map.radius < 0.995 * map.waferRadius && (
          <circle
            r={coordinate((R * map.radius) / map.waferRadius)}
            fill="none"
            stroke={colour("quiet")}
            strokeWidth={3}
            strokeDasharray="12 14"
          />
        )}
        {azimuths.map((azimuth) => (
          <ScanLine key={azimuth} azimuth={azimuth} />
        ))}
        {axis !== null && <Axis angle={axis} />}
      </svg>
      <MapLegend map={map} />
    </div>
  );
}

/** A place on the drawing: azimuth 0 is down, a quarter turn counter-clockwise to the right. */
const place = (azimuth: number, radius: number) => ({ x: radius * Math.sin(azimuth), y: radius * Math.cos(azimuth) });

/** The rim with its notch. */
function rim(): string {
  const half = Math.asin((1.6 * NOTCH) / R);
  const [right, left] = [place(half, R), place(-half, R)];
  const at = ({ x, y }: { x: number; y: number }) => `${coordinate(x)} ${coordinate(y)}`;
  return `M${at(right)}A${R} ${R} 0 1 0 ${at(left)}L0 ${R - 2 * NOTCH}Z`;
}

function ScanLine({ azimuth }: { azimuth: number }) {
  const [end, other, text] = [place(azimuth, R), place(azimuth + Math.PI, R), place(azimuth, R + 100)];
  return (
    <g>
      <path
        d={`M${coordinate(other.x)} ${coordinate(other.y)}L${coordinate(end.x)} ${coordinate(end.y)}`}
        stroke={colour("quiet")}
        strokeWidth={4}
        strokeDasharray="4 12"
      />
      <text
        x={coordinate(text.x)}
        y={coordinate(text.y + TEXT * 0.35)}
        textAnchor="middle"
        style={{ fontSize: TEXT, fill: colour("quiet") }}
      >
        {Math.round((azimuth * 180) / Math.PI)}°
      </text>
    </g>
  );
}

function Axis({ angle }: { angle: number }) {
  const [end, other] = [place(angle, R + 40), place(angle + Math.PI, R + 40)];
  return (
    <path
      d={`M${coordinate(other.x)} ${coordinate(other.y)}L${coordinate(end.x)} ${coordinate(end.y)}`}
      stroke={colour("copper")}
      strokeWidth={9}
      strokeDasharray="70 20 12 20"
    />
  );
}

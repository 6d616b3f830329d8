import { colour } from "#app/components/drawings/colour.ts";
import { coordinate } from "#app/components/drawings/coordinate.ts";
import { spotWords } from "#app/lib/spot-words.ts";
import type { WaferSpot } from "#app/schemas/incident.ts";

/** Radius of the wafer in the drawing, and the room around it. */
export const SPOT_RADIUS = 100;
const MARGIN = 16;
const NOTCH = 4;
export const SPOT_BOX = 2 * (SPOT_RADIUS + MARGIN);

/** A place on the drawing: azimuth 0 is down, a quarter turn counter-clockwise to the right. */
const place = ({ radius, azimuth }: WaferSpot) => ({
  x: SPOT_RADIUS * radius * Math.sin(azimuth),
  y: SPOT_RADIUS * radius * Math.cos(azimuth),
});
const at = ({ x, y }: { x: number; y: number }) => `${coordinate(x)} ${coordinate(y)}`;

/** A wafer as it is held, device side towards the reader and notch down, with a mark where something happened. */
export function WaferSpotDrawing({ spot }: { spot: WaferSpot | null }) {
  const half = Math.asin((1.6 * NOTCH) / SPOT_RADIUS);
  const [right, left] = [place({ radius: 1, azimuth: half }), place({ radius: 1, azimuth: 2 * Math.PI - half })];
  const mark = spot && place(spot);
  return (
    <svg
      viewBox={`${-SPOT_BOX / 2} ${-SPOT_BOX / 2} ${SPOT_BOX} ${SPOT_BOX}`}
      role="img"
      aria-label={spot ? `Wafer, notch down: ${spotWords(spot)}` : "Wafer, notch down: no place is marked"}
      className="block h-auto w-full"
    >
      <path
        d={`M${at(right)}A${SPOT_RADIUS} ${SPOT_RADIUS} 0 1 0 ${at(left)}L0 ${SPOT_RADIUS - 2 * NOTCH}Z`}
        fill={colour("siwash")}
        stroke={colour("silicon")}
        strokeWidth={1.5}
      />
      {[0.5, 0.9].map((radius) => (
        <circle
          key={radius}
          r={SPOT_RADIUS * radius}
          fill="none"
          stroke={colour("edge")}
          strokeWidth={0.6}
          strokeDasharray="2 3"
        />
      ))}
      <path d="M-6 0H6M0 -6V6" stroke={colour("edge")} strokeWidth={0.8} />
      {mark && (
        <g transform={`translate(${at(mark)})`} stroke={colour("stop")} strokeWidth={2} fill="none">
          <circle r={7} />
          <path d="M-11 0H11M0 -11V11" />
        </g>
      )}
    </svg>
  );
}

import { useOwnText } from "#app/components/units/OwnFigure.tsx";
import { colour } from "#app/components/drawings/colour.ts";
import { coordinate } from "#app/components/drawings/coordinate.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ToldProfile } from "#app/lib/scan-import/told.ts";

const [WIDTH, HEIGHT] = [320, 120];

/** A profile as it was read, drawn into its own range, with the ends of both axes in words. */
export function FileTrace({ profile: { name, points, trace } }: { profile: ToldProfile }) {
  const own = useOwnText();
  const [xs, zs] = [trace.map(({ x }) => x), trace.map(({ z }) => z)];
  const [left, right] = [Math.min(...xs), Math.max(...xs)];
  const [low, high] = [Math.min(...zs), Math.max(...zs)];
  const across = (x: number) => coordinate(((x - left) / (right - left || 1)) * WIDTH);
  const up = (z: number) => coordinate(HEIGHT - ((z - low) / (high - low || 1)) * HEIGHT);
  const path = trace.map(({ x, z }, n) => `${n === 0 ? "M" : "L"}${across(x)} ${up(z)}`).join("");
  const mm = (metres: number) => formatQuantity(metres, "length", { unit: "mm", decimals: 1 });
  const µm = (metres: number) => formatQuantity(metres, "length", { unit: "µm", decimals: 2 });
  return (
    <figure className="w-full max-w-88">
      <svg
        viewBox={`-1 -3 ${WIDTH + 2} ${HEIGHT + 6}`}
        className="w-full border border-line"
        role="img"
        aria-label={own(`Plot of ${name}: heights ${µm(low)} to ${µm(high)} over ${mm(left)} to ${mm(right)}`)}
      >
        <path d={path} fill="none" stroke={colour("copper")} strokeWidth="1.5" strokeLinejoin="round" />
      </svg>
      <figcaption className="mt-1 text-label text-quiet">
        {`${name}: ${points} points, ${mm(left)} to ${mm(right)}, heights ${µm(low)} to ${µm(high)}`}
      </figcaption>
    </figure>
  );
}

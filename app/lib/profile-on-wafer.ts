import { formatQuantity } from "#app/engine/units/format.ts";
import type { FileReading } from "#app/schemas/scan-result.ts";
import type { ReadProfile } from "./scan-reading/one-profile.ts";
import { ScanFileError } from "./scan-reading/refusal.ts";

export interface ScannedWafer {
  /** m */
  diameter: number;
  /** left out at either end of the scan, m */
  edgeExclusion: number;
}

/** A scan may start and end a little beyond the edge before it counts as another wafer's. */
const LONGEST_OVER_DIAMETER = 1.02;

const length = (metres: number) => formatQuantity(metres, "length", { significant: 3, trim: true });
const range = ({ from, to }: FileReading) =>
  `${formatQuantity(from, "length", { unit: "mm" })} to ${formatQuantity(to, "length", { unit: "mm" })}`;

/**
 * Holds a profile against the wafer that it is said to be of: a wrong unit shows here.
 * @throws ScanFileError when positions or heights cannot be of that wafer
 */
export function checkOnWafer(
  { points, reading }: { points: ReadProfile["points"]; reading: Pick<FileReading, "from" | "to"> },
  name: string,
  wafer: ScannedWafer,
): void {
  const span = reading.to - reading.from;
  const diameter = formatQuantity(wafer.diameter, "length", { unit: "mm" });
  if (span === 0) throw new ScanFileError(`${name}: all rows have the same position, ${length(reading.from)}.`);
  if (span > wafer.diameter * LONGEST_OVER_DIAMETER)
    throw new ScanFileError(
      `${name}: the positions run over ${length(span)}, but the wafer measures ${diameter}. Check the unit of the position and the diameter.`,
    );
  if (span <= 2 * wafer.edgeExclusion)
    throw new ScanFileError(
      `${name}: the positions run over ${length(span)}; with ${length(wafer.edgeExclusion)} left out at either end nothing remains. Check the unit of the position, or leave out less.`,
    );
  const differ = spread(points.z);
  if (differ > wafer.diameter / 2)
    throw new ScanFileError(
      `${name}: the heights differ by ${length(differ)}, more than the radius of the wafer. Check the unit of the height.`,
    );
}

function spread(values: Float64Array): number {
  let [low, high] = [Infinity, -Infinity];
  for (let n = 0; n < values.length; n += 1) {
    const value = values[n] ?? 0;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return high - low;
}

/**
 * Holds two profiles against each other.
 * @throws ScanFileError when they do not cover a common stretch that is long enough
 */
export function checkTogether(
  before: { name: string; profile: ReadProfile },
  after: { name: string; profile: ReadProfile },
  { edgeExclusion }: ScannedWafer,
): void {
  const [first, second] = [before.profile.reading, after.profile.reading];
  const common = Math.min(first.to, second.to) - Math.max(first.from, second.from);
  if (common > 2 * edgeExclusion) return;
  const where = `${before.name} runs from ${range(first)}, ${after.name} from ${range(second)}`;
  throw new ScanFileError(
    common <= 0
      ? `The positions do not overlap: ${where}. Both scans must lie on the same line of the wafer.`
      : `The positions overlap over ${length(common)} only: ${where}. With ${length(edgeExclusion)} left out at either end nothing remains.`,
  );
}

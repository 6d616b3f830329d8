import { useState } from "react";
import { ParityDrawing } from "#app/components/drawings/ParityDrawing.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { withExpanded } from "#app/lib/prediction-words.ts";
import type { Predicted, PredictionPoint } from "#app/schemas/prediction.ts";
import { useOwnText } from "#app/components/units/OwnFigure.tsx";

interface Props {
  of: Predicted;
  points: readonly PredictionPoint[];
  /** groups that the model is off at */
  off: ReadonlySet<string>;
}

/** The parity plot with its read-out: by pointer, or from point to point with the arrow keys. */
export function ParityFigure({ of, points, off }: Props) {
  const [chosen, choose] = useState<string | null>(null);
  const own = useOwnText();
  const inBrowser = useInBrowser();
  const ordered = points.toSorted((a, b) => a.predicted - b.predicted || a.measured - b.measured);
  const marks = ordered.map((point) => ({ ...point, off: off.has(point.group) }));
  const at = ordered.findIndex(({ id }) => id === chosen);
  const read = ordered[at];
  const label = `Measured over predicted ${of === "bow" ? "bow" : "stress"}, ${points.length === 1 ? "one point" : `${points.length} points`}`;
  const drawing = { of, marks, label, chosen, onPoint: choose };
  return (
    <figure>
      <ParityDrawing {...drawing} className="hidden h-auto w-full max-w-140 tablet:block" />
      <ParityDrawing {...drawing} size={340} className="block h-auto w-full tablet:hidden" />
      {inBrowser && (
        <div className="screen-only min-h-18 max-w-140 pt-1.5">
          <input
            type="range"
            className="plot-cursor block w-full"
            min={0}
            max={Math.max(1, ordered.length - 1)}
            step={1}
            value={Math.max(0, at)}
            aria-label="Read point by point"
            aria-valuetext={read ? own(readText(of, read)) : "no point is read yet"}
            onChange={(event) =>
              choose(ordered[Math.min(event.currentTarget.valueAsNumber, ordered.length - 1)]?.id ?? null)
            }
          />
          <p className="text-label" aria-hidden="true">
            {read ? readText(of, read) : "Move along the points to read them."}
          </p>
        </div>
      )}
      <figcaption className="mt-2 max-w-140 text-label text-quiet">
        On the dashed line both agree. Bars: ±, k = 2. Square: of a {of === "bow" ? "step" : "film"} that the model is
        off at.
      </figcaption>
    </figure>
  );
}

const readText = (
  of: Predicted,
  { name, group, predicted, predictedUncertainty, measured, measuredUncertainty }: PredictionPoint,
) =>
  `${name}, ${group}: predicted ${withExpanded(of, predicted, predictedUncertainty)}, measured ${withExpanded(of, measured, measuredUncertainty)}`;

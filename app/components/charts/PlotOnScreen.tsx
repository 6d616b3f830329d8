import { lazy, startTransition, Suspense, useLayoutEffect, useMemo, useRef, useState, type PointerEvent } from "react";
import type { Plot } from "../drawings/plot.ts";
import { plotFrame } from "../drawings/plot-frame.ts";
import { PrintPlot } from "../drawings/PrintPlot.tsx";
import { axisValue, nearestStop } from "./axis-value.ts";
import type { LivePlotProps } from "./LivePlot.tsx";
import { PlotCursor } from "./PlotCursor.tsx";
import { PlotReadOut } from "./PlotReadOut.tsx";

export interface PlotOnScreenProps {
  plot: Plot;
  label: string;
  /** Name of the x quantity. */
  xName: string;
}

const TEXT = 12.5;
const NARROW = 560;

/** The charting library comes with the first reach for a chart; should it not come at all, the drawing stays. */
const LivePlot = lazy(() => import("./LivePlot.tsx").catch(() => ({ default: StillPlot })));

/**
 * A plot on a screen. It is drawn by ourselves, on the server as in the browser, with its read-out under it, until somebody reaches for
 * it by pointer, touch or key: then the charting library draws the same in the same frame. A plot that changes while nobody reads it,
 * as while a stack is typed, is drawn by ourselves again, which takes a fraction of the time.
 */
export function PlotOnScreen({ plot, label, xName }: PlotOnScreenProps) {
  const [holder, width] = useWidth();
  const [read, setRead] = useState<number | null>(null);
  // Another plot in the place of the one that was reached for has not been reached for.
  const [reachedFor, setReachedFor] = useState<Plot | null>(null);
  const reached = reachedFor === plot;
  const narrow = width < NARROW;
  const height = narrow ? 320 : 428;
  const frame = useMemo(() => plotFrame(plot, width, height, TEXT, !narrow), [plot, width, height, narrow]);
  // Reading moves the cursor and leaves the drawing as it is.
  const drawing = useMemo(() => {
    const drawn: LivePlotProps = { plot, label, width, height, frame, textSize: TEXT, narrow };
    const still = <StillPlot {...drawn} />;
    if (!reached) return still;
    return (
      <Suspense fallback={still}>
        <LivePlot {...drawn} />
      </Suspense>
    );
  }, [plot, label, width, height, frame, narrow, reached]);
  const reach = () => {
    if (!reached) startTransition(() => setReachedFor(plot));
  };
  const readAt = (x: number) => {
    reach();
    setRead(x);
  };
  const follow = (event: PointerEvent<HTMLDivElement>) => {
    if (event.pointerType !== "mouse") return;
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
    readAt(nearestStop(plot.x, axisValue(plot.x, (x - frame.left) / (frame.right - frame.left))));
  };
  return (
    <div ref={holder} onPointerEnter={reach} onFocus={reach}>
      {width === 0 ? (
        <BothWidths plot={plot} label={label} />
      ) : (
        <>
          <div className="relative" onPointerMove={follow}>
            {drawing}
            {read === null ? null : <PlotCursor plot={plot} x={read} width={width} height={height} frame={frame} />}
          </div>
          <PlotReadOut
            plot={plot}
            xName={xName}
            at={read ?? plot.chosen?.x ?? nearestStop(plot.x, axisValue(plot.x, 0.5))}
            frame={frame}
            onRead={readAt}
          />
        </>
      )}
    </div>
  );
}

/** The width of an element, kept up to date; 0 before it is known. */
function useWidth() {
  const ref = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(0);
  useLayoutEffect(() => {
    const element = ref.current;
    if (element === null) return undefined;
    setWidth(element.clientWidth);
    const observer = new ResizeObserver(() => setWidth(element.clientWidth));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width] as const;
}

/** The plot in the frame of the live one, so that either takes the other's place without a shift. */
function StillPlot({ plot, label, width, height, textSize, narrow }: LivePlotProps) {
  return (
    <PrintPlot
      plot={plot}
      label={label}
      width={width}
      height={height}
      textSize={textSize}
      withoutEndLabels={narrow}
      className="block w-full"
    />
  );
}

/** Both widths of the drawing; the stylesheet shows the one that fits, since the server does not know the window. */
function BothWidths({ plot, label }: { plot: Plot; label: string }) {
  return (
    <>
      <PrintPlot plot={plot} label={label} className="hidden h-[428px] w-full @min-[560px]:block" />
      <PrintPlot
        plot={plot}
        label={label}
        width={340}
        height={320}
        withoutEndLabels
        className="block h-80 w-full @min-[560px]:hidden"
      />
    </>
  );
}

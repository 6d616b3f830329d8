import { useId, type PointerEvent } from "react";
import { colour } from "#app/components/drawings/colour.ts";
import { coordinate } from "#app/components/drawings/coordinate.ts";
import { planeBox, planePath, type PlaneBox, type PlaneSize } from "#app/components/drawings/plane.ts";
import { PlaneAxes } from "#app/components/drawings/PlaneAxes.tsx";
import { PlaneMark } from "#app/components/drawings/PlaneMark.tsx";
import { PlaneWords } from "#app/components/drawings/PlaneWords.tsx";
import type { SweepAnswer } from "#app/lib/stack-sweep/answers.ts";
import { shareAt } from "#app/lib/stack-sweep/axis.ts";
import { ticksOn } from "#app/lib/stack-sweep/ticks.ts";
import type { DrawnAxis, DrawnMap } from "#app/schemas/stack-sweep.ts";
import { MapLevels } from "./MapLevels.tsx";
import { MapThresholds } from "./MapThresholds.tsx";
import { ownWords } from "./own-words.ts";
import { axisName } from "./sweep-plot.ts";

interface Props {
  map: DrawnMap;
  answer: SweepAnswer;
  label: string;
  size: PlaneSize;
  /** the place that is read, in shares */
  read?: { x: number; y: number } | null;
  /** told the shares of a place that is pointed at */
  onPoint?: (x: number, y: number) => void;
}

/** Level lines this far apart rule what has no answer, px. */
const RULE_PITCH = 5;

/** An answer over two inputs: its lines with their values, the limit heavy, what is curled shaded, and the stack itself. Pure. */
export function MapPlot({ map, answer, label, size, read = null, onPoint }: Props) {
  const box = planeBox(size);
  const { x, y, own } = map;
  const point = (event: PointerEvent<SVGSVGElement>) => {
    const drawn = event.currentTarget.getBoundingClientRect();
    const px = ((event.clientX - drawn.left) / drawn.width) * size.width;
    const py = ((event.clientY - drawn.top) / drawn.height) * size.height;
    onPoint?.((px - box.left) / box.width, (box.bottom - py) / box.height);
  };
  const mark = own && {
    x: box.atX(own.x),
    y: box.atY(own.y),
    text: own.value === null ? answer.none : answer.words(own.value),
  };
  return (
    <svg
      viewBox={`0 0 ${size.width} ${size.height}`}
      className="block h-auto w-full max-w-220"
      role="img"
      aria-label={label}
      onPointerMove={onPoint && ((event) => event.pointerType === "mouse" && point(event))}
      onPointerDown={onPoint && point}
    >
      <Regions map={map} box={box} />
      <MapThresholds axis={x} along="x" box={box} textSize={size.text * 0.85} />
      <MapThresholds axis={y} along="y" box={box} textSize={size.text * 0.85} />
      <MapLevels map={map} answer={answer} box={box} textSize={size.text * 0.9} mark={mark} />
      <PlaneAxes
        size={size}
        ticks={{ x: planeTicks(x, size.ticks), y: planeTicks(y, size.ticks) }}
        names={{ x: axisName(x), y: axisName(y) }}
      />
      {mark ? (
        <>
          <PlaneMark x={mark.x} y={mark.y} />
          <PlaneWords {...ownWords(mark, box, size.text)} text={mark.text} textSize={size.text} bold />
        </>
      ) : null}
      {read ? (
        <path
          d={`M${coordinate(box.atX(read.x))} ${box.top}V${box.bottom}M${box.left} ${coordinate(box.atY(read.y))}H${box.right}`}
          stroke={colour("copper")}
          pointerEvents="none"
        />
      ) : null}
    </svg>
  );
}

const planeTicks = (axis: DrawnAxis, count: number) =>
  ticksOn(axis, count).map(({ value, text }) => ({ at: shareAt(axis, value), text }));

/** What is curled, shaded up to the line at which it begins; what has no answer is ruled over. */
function Regions({ map: { curled, without }, box }: { map: DrawnMap; box: PlaneBox }) {
  const id = useId();
  let rules = "";
  for (let y = box.top + RULE_PITCH / 2; y < box.bottom; y += RULE_PITCH) rules += `M${box.left} ${y}H${box.right}`;
  return (
    <>
      <path d={planePath(curled.outlines, box)} fill={colour("wash")} fillRule="evenodd" />
      {without.length > 0 ? (
        <>
          <clipPath id={id}>
            <path d={planePath(without, box)} clipRule="evenodd" />
          </clipPath>
          <g clipPath={`url(#${id})`}>
            <path d={rules} stroke={colour("quiet")} strokeWidth={0.6} />
          </g>
        </>
      ) : null}
      <path d={planePath(curled.begins, box)} fill="none" stroke={colour("ink")} strokeWidth={1} />
    </>
  );
}

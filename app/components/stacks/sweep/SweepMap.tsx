import { useState } from "react";
import { PlaneFigure } from "#app/components/drawings/PlaneFigure.tsx";
import { PlaneTable } from "#app/components/drawings/PlaneTable.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { SweepAnswer } from "#app/lib/stack-sweep/answers.ts";
import { valueAt } from "#app/lib/stack-sweep/axis.ts";
import { placeState } from "#app/lib/stack-sweep/place-words.ts";
import type { DrawnMap } from "#app/schemas/stack-sweep.ts";
import { MapPlot } from "./MapPlot.tsx";
import { MapReadOut } from "./MapReadOut.tsx";
import { axisName, axisText } from "./sweep-plot.ts";

interface Props {
  map: DrawnMap;
  answer: SweepAnswer;
  label: string;
}

/** Every how many places the table has a row and a column. */
const TABLE_STEP = 8;

/** A map that can be read place by place, with every few places as a table. */
export function SweepMap({ map, answer, label }: Props) {
  const { x, y, cells, own, levels } = map;
  const inBrowser = useInBrowser();
  const [read, setRead] = useState<{ column: number; row: number } | null>(null);
  const clamped = (share: number) => Math.round(Math.min(1, Math.max(0, share)) * cells);
  const at = read ?? { column: clamped(own?.x ?? 0.5), row: clamped(own?.y ?? 0.5) };
  const words = (column: number, row: number) => placeWords(map, answer, column, row);
  const every = Array.from({ length: cells / TABLE_STEP + 1 }, (_, n) => n * TABLE_STEP);
  const limits = [...new Set(levels.flatMap(({ limit }) => limit ?? []))];
  return (
    <figure>
      <PlaneFigure names={{ x: axisName(x), y: axisName(y) }}>
        {(size) => (
          <MapPlot
            map={map}
            answer={answer}
            label={label}
            size={size}
            read={read && { x: read.column / cells, y: read.row / cells }}
            onPoint={(alongX, alongY) => setRead({ column: clamped(alongX), row: clamped(alongY) })}
          />
        )}
      </PlaneFigure>
      {inBrowser ? <MapReadOut map={map} at={at} words={words(at.column, at.row)} onRead={setRead} /> : null}
      <figcaption className="mt-2 text-label text-quiet">
        Lines: {answer.noun}, found on the full model.
        {limits.length > 0 ? ` Heavy: ${limits.join("; ")}.` : ""} Shaded: curled about one axis.
        {map.without.length > 0 ? ` Ruled: ${answer.none}.` : ""} Ring: the stack as it is. Gravity is left out.
      </figcaption>
      <PlaneTable
        summary="Figures as a table"
        caption={`${answer.label} by ${axisName(y)}, down, and ${axisName(x)}, across`}
        columns={every.map((column) => axisText(x, valueAt(x, column / cells)))}
        rows={every.toReversed().map((row) => ({
          head: axisText(y, valueAt(y, row / cells)),
          cells: every.map((column) => words(column, row)),
        }))}
      />
    </figure>
  );
}

/** What the answer is at a place, in words. */
function placeWords({ cells, values, states }: DrawnMap, answer: SweepAnswer, column: number, row: number): string {
  const place = row * (cells + 1) + column;
  const state = placeState(states, place);
  const value = values[place] ?? null;
  if (state === "3") return "refused by the engine";
  if (value === null) return answer.none;
  return `${answer.words(value)}${state === "1" ? ", curled" : ""}`;
}

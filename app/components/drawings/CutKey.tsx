import { memo } from "react";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { CUT, layerHeight } from "./cut-layout.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

/** Four bars that show how height goes with thickness, at 0.4 of the drawn height, and what the arrows mean. */
export const CutKey = memo(function CutKey({ y }: { y: number }) {
  return (
    <g aria-hidden="true">
      <text x={CUT.left} y={y} style={{ fill: colour("quiet") }}>
        Drawn height by thickness, <OwnHead unit="µm" />
      </text>
      {[700, 100, 10, 1].map((micrometres, index) => {
        const height = layerHeight(micrometres * 1e-6, 1) * 0.4;
        const x = CUT.left + index * 46;
        return (
          <g key={micrometres}>
            <rect
              x={x + 0.5}
              y={coordinate(y + 82 - height)}
              width="34"
              height={coordinate(height)}
              fill={colour("siwash")}
              stroke={colour("ink")}
              strokeWidth="0.75"
            />
            <text x={x + 17.5} y={y + 97} textAnchor="middle" style={{ fill: colour("quiet") }}>
              <OwnFigure unit="µm">{micrometres}</OwnFigure>
            </text>
          </g>
        );
      })}
      {["Arrows: apart, tension;", "together, compression.", "Length: root of film force."].map((line, index) => (
        <text key={line} x={CUT.label} y={y + index * 16} style={{ fill: colour("quiet") }}>
          {line}
        </text>
      ))}
    </g>
  );
});

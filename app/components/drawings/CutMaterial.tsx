import { memo } from "react";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";

/** What a layer is made of, as far as a cut shows it; `blank` while nobody has said. */
export type MaterialKind = "metal" | "polymer" | "inorganic" | "solder" | "silicon" | "glass" | "adhesive" | "blank";

export interface CutMaterialProps {
  kind: MaterialKind;
  x: number;
  y: number;
  width: number;
  height: number;
}

/**
 * The filling of a layer. Materials never use diagonals, so that a cut cannot be read as a warning: upright lines metal,
 * level lines polymer, dots oxide or nitride, rings solder, flat tint silicon, waves bonding material, short dashes
 * glass. Lines in a clipping svg and never a pattern, because patterns print as blocks.
 */
export const CutMaterial = memo(function CutMaterial({ kind, x, y, width, height }: CutMaterialProps) {
  return (
    <>
      <rect x={x} y={y} width={width} height={height} fill={colour(kind === "silicon" ? "siwash" : "raised")} />
      {kind === "silicon" || kind === "blank" ? null : (
        <svg x={x} y={y} width={width} height={height} overflow="hidden">
          <Filling kind={kind} width={width} height={height} />
        </svg>
      )}
    </>
  );
});

type FillingProps = { kind: Exclude<MaterialKind, "silicon" | "blank">; width: number; height: number };

function Filling({ kind, width, height }: FillingProps) {
  switch (kind) {
    case "metal":
      return <path d={uprights(width, height, 4)} stroke={colour("copper")} strokeWidth="1.6" />;
    case "polymer":
      return <path d={levels(width, height, 5)} stroke={colour("quiet")} strokeWidth="0.8" />;
    case "inorganic":
      // Rows of round caps without length are dots: one short path instead of hundreds of circles.
      return (
        <g stroke={colour("silicon")} strokeWidth="1.8" strokeLinecap="round" strokeDasharray="0 5">
          <path d={levels(width, height, 5, 1.2, 1.2)} />
          <path d={levels(width, height, 5, 3.7, 3.7)} />
        </g>
      );
    case "solder":
      return (
        <g fill="none" stroke={colour("copper")} strokeWidth="1.1">
          {rows(height, 11, 5.5).map((y) => (
            <path key={y} d={rings(width, y)} />
          ))}
        </g>
      );
    case "adhesive":
      return (
        <g fill="none" stroke={colour("quiet")} strokeWidth="0.9">
          {rows(height, 6, 3).map((y) => (
            <path key={y} d={`M0 ${coordinate(y)}q2.5 -3 5 0${"t5 0".repeat(Math.ceil(width / 5))}`} />
          ))}
        </g>
      );
    case "glass":
      return (
        <g stroke={colour("quiet")} strokeWidth="0.8" strokeDasharray="5 9">
          <path d={levels(width, height, 20, 5, 3)} />
          <path d={levels(width, height, 20, 15, 10)} />
        </g>
      );
  }
}

function rows(height: number, pitch: number, first: number): number[] {
  const places: number[] = [];
  for (let y = first; y < height; y += pitch) places.push(y);
  return places;
}

function levels(width: number, height: number, pitch: number, first = pitch / 2, from = 0): string {
  return rows(height, pitch, first)
    .map((y) => `M${from} ${coordinate(y)}H${coordinate(width)}`)
    .join("");
}

function uprights(width: number, height: number, pitch: number): string {
  return rows(width, pitch, pitch / 2)
    .map((x) => `M${coordinate(x)} 0V${coordinate(height)}`)
    .join("");
}

function rings(width: number, y: number): string {
  return rows(width, 12, 6)
    .map((x) => `M${coordinate(x - 3)} ${coordinate(y)}a3 3 0 1 0 6 0a3 3 0 1 0 -6 0`)
    .join("");
}

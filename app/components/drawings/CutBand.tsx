import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import type { CutLayer } from "./cut-layer.ts";
import { CUT } from "./cut-layout.ts";
import { CutMaterial } from "./CutMaterial.tsx";

export interface CutBandProps {
  layer: CutLayer;
  y: number;
  height: number;
}

const WIDTH = CUT.right - CUT.left;
/** Patterned metal is drawn as this many lines. */
const LINES = 5;
const LONGEST_ARROW = 70;

/** One layer of the cut: its material, its break line when it is drawn shortened, and the arrows of its stress. */
export function CutBand({ layer, y, height }: CutBandProps) {
  const shortened = layer.role === "silicon" || layer.role === "carrier";
  const patterned = layer.kind === "metal" && layer.coverage !== undefined && layer.coverage < 1;
  return (
    <>
      {patterned ? (
        <MetalLines coverage={layer.coverage ?? 1} y={y} height={height} />
      ) : (
        <CutMaterial kind={layer.kind} x={CUT.left} y={y} width={WIDTH} height={height} />
      )}
      {shortened ? (
        <BreakLine y={y} height={height} />
      ) : (
        <rect x={CUT.left} y={y} width={WIDTH} height={height} fill="none" stroke={colour("ink")} />
      )}
      {layer.stress ? <StressArrows layer={layer} y={y + height / 2} /> : null}
    </>
  );
}

/** Lines as wide as their share of the area, in polymer. */
function MetalLines({ coverage, y, height }: { coverage: number; y: number; height: number }) {
  const pitch = WIDTH / LINES;
  const width = pitch * coverage;
  return (
    <>
      <CutMaterial kind="polymer" x={CUT.left} y={y} width={WIDTH} height={height} />
      {Array.from({ length: LINES }, (_, index) => {
        const x = CUT.left + pitch * index + (pitch - width) / 2;
        return (
          <g key={index}>
            <CutMaterial kind="metal" x={x} y={y} width={width} height={height} />
            <rect x={x} y={y} width={width} height={height} fill="none" stroke={colour("copper")} />
          </g>
        );
      })}
    </>
  );
}

/** Long break line: the layer is much thicker than drawn. Two strokes 5 px apart with a zigzag 18 px high. */
function BreakLine({ y, height }: { y: number; height: number }) {
  const middle = y + height / 2;
  const stroke = (shift: number) =>
    `M${CUT.left - 8} ${coordinate(middle + shift)}H${CUT.left + 78}l6 -9l10 18l6 -9H${CUT.right + 8}`;
  const gap = `${stroke(-2.5)}V${coordinate(middle + 2.5)}H${CUT.left + 100}l-6 9l-10 -18l-6 9H${CUT.left - 8}Z`;
  const upper = `M${CUT.left} ${coordinate(middle - 2.5)}V${y}H${CUT.right}V${coordinate(middle - 2.5)}`;
  const lower = `M${CUT.left} ${coordinate(middle + 2.5)}V${y + height}H${CUT.right}V${coordinate(middle + 2.5)}`;
  return (
    <>
      <path d={upper + lower} fill="none" stroke={colour("ink")} strokeWidth="1.2" />
      <path d={gap} fill={colour("raised")} />
      <path d={stroke(-2.5) + stroke(2.5)} fill="none" stroke={colour("ink")} strokeWidth="0.9" />
    </>
  );
}

/** Arrows on a plate at both ends, length 8 + 1.3·√|N| px with the film force N in N/m. */
function StressArrows({ layer, y }: { layer: CutLayer; y: number }) {
  const stress = layer.stress ?? 0;
  const force = Math.abs(stress) * layer.thickness * (layer.coverage ?? 1);
  const length = Math.min(LONGEST_ARROW, 8 + 1.3 * Math.sqrt(force));
  const plate = length + 13;
  const tension = stress > 0;
  const middle = coordinate(y);
  /** Shaft from `x` in direction `way`, then the head, 7 px long. */
  const arrow = (x: number, way: 1 | -1) => ({
    shaft: `M${coordinate(x)} ${middle}h${coordinate(way * length)}`,
    head: `M${coordinate(x + way * (length + 5))} ${middle}l${-way * 7} -3.6v7.2z`,
  });
  const left = tension ? arrow(CUT.left + 12 + length, -1) : arrow(CUT.left + 7, 1);
  const right = tension ? arrow(CUT.right - 12 - length, 1) : arrow(CUT.right - 7, -1);
  return (
    <>
      {[CUT.left + 4, CUT.right - 4 - plate].map((x) => (
        <rect key={x} x={coordinate(x)} y={y - 7} width={coordinate(plate)} height="14" fill={colour("raised")} />
      ))}
      <path d={left.shaft + right.shaft} stroke={colour("ink")} strokeWidth="1.6" />
      <path d={left.head + right.head} fill={colour("ink")} />
    </>
  );
}

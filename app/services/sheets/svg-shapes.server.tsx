/** @jsxImportSource react */
import { Circle, G, Path, Rect, Text } from "@react-pdf/renderer";
import type { ReactNode } from "react";
import { widthOf } from "#app/lib/sheet/paper-lines.ts";
import { FONT_FAMILIES } from "./pdf-fonts.server.ts";
import { attributesOf, type SvgNode } from "./svg-tree.ts";

type Attributes = Record<string, string>;

const number = (value: string | undefined, otherwise = 0) => (value === undefined ? otherwise : Number(value));

/** Bounds at which a part of a drawing is cut off; a PDF has them at the head of the drawing. */
export interface Clip {
  id: string;
  box: { x: number; y: number; width: number; height: number };
}

/** An element of a drawing and all in it, as shapes of a PDF. `key` is its place; what cuts parts of it off goes into `clips`. */
export function pdfShapes(node: SvgNode | string, key: string, clips: Clip[]): ReactNode {
  if (typeof node === "string") return null;
  const own = attributesOf(node);
  const shapes = () => node.children.map((child, index) => pdfShapes(child, `${key}-${index}`, clips));
  switch (node.name) {
    case "g":
      return (
        <G key={key} {...(own.transform ? { transform: own.transform } : {})}>
          {shapes()}
        </G>
      );
    case "path":
      return <Path key={key} d={own.d ?? ""} {...paint(own)} />;
    case "rect":
      return <Rect key={key} {...box(own)} {...paint(own)} />;
    case "circle":
      return <Circle key={key} cx={number(own.cx)} cy={number(own.cy)} r={number(own.r)} {...paint(own)} />;
    case "svg":
      return nested({ key, own, clips }, shapes());
    case "text":
      return words(key, own, node);
    case "title":
      return null;
    default:
      throw new Error(`a drawing on paper has no ${node.name}`);
  }
}

const box = (own: Attributes) => ({
  x: number(own.x),
  y: number(own.y),
  width: number(own.width),
  height: number(own.height),
});

/** Fill and stroke; what states no fill is black, as in a browser, unless it is drawn by its outline. */
function paint(own: Attributes) {
  return {
    fill: own.fill ?? "#000000",
    ...(own.stroke && own.stroke !== "none" ? { stroke: own.stroke, strokeWidth: number(own["stroke-width"], 1) } : {}),
    ...(own["stroke-dasharray"] ? { strokeDasharray: own["stroke-dasharray"] } : {}),
    ...(own["stroke-linejoin"] === "round" ? { strokeLinejoin: "round" as const } : {}),
    ...(own["stroke-linecap"] === "round" ? { strokeLinecap: "round" as const } : {}),
    ...(own["fill-opacity"] ? { fillOpacity: number(own["fill-opacity"]) } : {}),
  };
}

/** A drawing in a drawing: moved to its place, and cut off at its bounds. */
function nested({ key, own, clips }: { key: string; own: Attributes; clips: Clip[] }, shapes: ReactNode): ReactNode {
  const { x, y, width, height } = box(own);
  const [left = 0, top = 0] = (own.viewBox ?? "0 0").split(" ").map(Number);
  const id = `clip-${key}`;
  clips.push({ id, box: { x: left, y: top, width, height } });
  return (
    <G key={key} transform={`translate(${x - left} ${y - top})`}>
      <G clipPath={`url(#${id})`}>{shapes}</G>
    </G>
  );
}

const SIZE = 12.5;
/** How far words over lines clear the ground around them, as a share of their size. */
const CLEAR = 0.12;

/** A text; where it keeps a rim in the colour of its ground, that ground is drawn under it. */
function words(key: string, own: Attributes, node: SvgNode): ReactNode {
  const text = node.children.filter((child) => typeof child === "string").join("");
  const size = number(own["font-size"], SIZE);
  const weight = number(own["font-weight"], 400);
  const [x, y] = [number(own.x), number(own.y)];
  const anchor = own["text-anchor"] ?? "start";
  const written = (
    <Text
      key={key}
      x={x}
      y={y}
      fill={own.fill ?? "#000000"}
      textAnchor={anchor as "start" | "middle" | "end"}
      style={{ fontSize: size, fontWeight: weight === 600 ? 600 : 400, fontFamily: FONT_FAMILIES } as never}
    >
      {text}
    </Text>
  );
  if (own["paint-order"] !== "stroke") return written;
  // An em has 12 points to 4.2333 mm; widths count in units of the drawing here.
  const width = widthOf(text, size, weight === 600) / (25.4 / 72);
  const left = anchor === "middle" ? x - width / 2 : anchor === "end" ? x - width : x;
  const rim = size * CLEAR;
  return (
    <G key={key}>
      <Rect
        x={left - rim}
        y={y - size * 0.76}
        width={width + 2 * rim}
        height={size * 0.98}
        fill={own.stroke ?? "#ffffff"}
      />
      {written}
    </G>
  );
}

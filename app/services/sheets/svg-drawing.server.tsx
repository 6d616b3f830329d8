/** @jsxImportSource react */
import { ClipPath, Defs, Rect, Svg } from "@react-pdf/renderer";
import { Children, type ReactElement, type ReactNode } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { attributesOf, svgTree } from "./svg-tree.ts";
import { pdfShapes, type Clip } from "./svg-shapes.server.tsx";

/**
 * A drawing of our own as vectors of a PDF: what the browser would be sent is read back, so that both draw the very same lines.
 * @param size mm
 */
export function svgDrawing(drawing: ReactElement, size: { width: number; height: number }): ReactNode {
  const root = svgTree(renderToStaticMarkup(Children.only(drawing)));
  const { viewBox } = attributesOf(root);
  if (viewBox === undefined) throw new Error("a drawing on paper has a viewBox");
  const clips: Clip[] = [];
  const shapes = root.children.map((child, index) => pdfShapes(child, `${index}`, clips));
  return (
    <Svg viewBox={viewBox} style={{ width: `${size.width}mm`, height: `${size.height}mm` }}>
      {clips.length === 0 ? null : (
        <Defs>
          {clips.map(({ id, box }) => (
            <ClipPath key={id} id={id}>
              <Rect {...box} />
            </ClipPath>
          ))}
        </Defs>
      )}
      {shapes}
    </Svg>
  );
}

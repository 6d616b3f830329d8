/** @jsxImportSource react */
import { Text, View } from "@react-pdf/renderer";
import type { ComponentProps } from "react";
import type { Kit, KitStyle } from "#app/components/sheet/paper/kit.ts";
import { svgDrawing } from "./svg-drawing.server.tsx";

type PdfStyle = ComponentProps<typeof View>["style"];

/** Lines of PDF boxes have to be told that they are solid; the lengths are the same. */
function pdfStyle({ fontWeight, ...style }: KitStyle = {}): PdfStyle {
  return { borderStyle: "solid", ...(fontWeight && { fontWeight }), ...style } as PdfStyle;
}

/** The kit of a PDF: the same boxes and texts, and drawings as vectors. */
export const PDF_KIT: Kit = {
  Box: ({ style, children }) => <View style={pdfStyle(style)}>{children}</View>,
  Text: ({ style, children }) => <Text style={pdfStyle(style)}>{children}</Text>,
  Run: ({ style, children }) => <Text style={pdfStyle(style)}>{children}</Text>,
  Drawing: ({ width, height, children }) => svgDrawing(children, { width, height }),
};

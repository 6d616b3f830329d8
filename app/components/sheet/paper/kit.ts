import type { ComponentType, ReactElement, ReactNode } from "react";

/** A length on paper. */
export type PaperLength = `${number}mm` | `${number}pt` | `${number}%` | 0;

export const mm = (value: number): PaperLength => `${value}mm`;
export const pt = (value: number): PaperLength => `${value}pt`;

type Side = "Top" | "Right" | "Bottom" | "Left";

/** What browser and PDF lay out alike: boxes that bend as flex boxes do, without margins that collapse. */
export interface KitStyle extends Partial<
  Record<`padding${Side}` | `margin${Side}` | `border${Side}Width`, PaperLength>
> {
  flexDirection?: "row" | "column";
  flexWrap?: "wrap";
  flexGrow?: number;
  flexShrink?: number;
  flexBasis?: PaperLength;
  justifyContent?: "space-between" | "flex-end" | "center";
  alignItems?: "center" | "flex-end" | "flex-start" | "stretch";
  rowGap?: PaperLength;
  columnGap?: PaperLength;
  width?: PaperLength;
  height?: PaperLength;
  minHeight?: PaperLength;
  position?: "absolute" | "relative";
  top?: PaperLength;
  left?: PaperLength;
  right?: PaperLength;
  bottom?: PaperLength;
  fontSize?: PaperLength;
  fontWeight?: 400 | 600;
  /** as a multiple of the size */
  lineHeight?: number;
  textAlign?: "left" | "right" | "center";
  color?: string;
  borderColor?: string;
  backgroundColor?: string;
}

/** What a box is to who does not see it. The PDF takes the headings and tables of it that it can. */
export type KitRole =
  "table" | "rowgroup" | "row" | "columnheader" | "rowheader" | "cell" | "list" | "listitem" | "region";

export interface KitBox {
  style?: KitStyle;
  role?: KitRole;
  label?: string;
  /** how many columns a cell spans */
  span?: number;
  /** for the styles of narrow screens */
  className?: string;
  /** scrolls sideways where a screen is too narrow for it, by keys as well */
  scrolls?: boolean;
  children?: ReactNode;
}

export interface KitText {
  style?: KitStyle;
  as?: "h1" | "h2" | "h3" | "p";
  className?: string;
  children?: ReactNode;
}

export interface KitDrawing {
  /** mm */
  width: number;
  height: number;
  className?: string;
  /** one svg element of our own, with a viewBox */
  children: ReactElement;
}

/** What a sheet is built of: the same tree becomes a page for the browser and a page of a PDF. */
export interface Kit {
  Box: ComponentType<KitBox>;
  /** a paragraph; `Run` inside it is a stretch in another weight */
  Text: ComponentType<KitText>;
  Run: ComponentType<Pick<KitText, "style" | "children">>;
  Drawing: ComponentType<KitDrawing>;
}

/** Black on white. */
export const PAPER_COLOURS = { ink: "#000000", quiet: "#3a3a3a", cell: "#b5b5b5", white: "#ffffff" } as const;

/** Sizes of type, pt, with their line as a multiple. */
export const TYPE = {
  label: { fontSize: pt(7), lineHeight: 8.5 / 7 },
  head: { fontSize: pt(8), lineHeight: 9.6 / 8 },
  table: { fontSize: pt(8), lineHeight: 9.6 / 8 },
  value: { fontSize: pt(9), lineHeight: 11 / 9 },
  title: { fontSize: pt(10.5), lineHeight: 13 / 10.5 },
  body: { fontSize: pt(11), lineHeight: 13.2 / 11 },
  group: { fontSize: pt(14), lineHeight: 17 / 14 },
  answer: { fontSize: pt(16), lineHeight: 20.5 / 16 },
} as const satisfies Record<string, KitStyle>;

export const BOLD = { fontWeight: 600 } as const satisfies KitStyle;

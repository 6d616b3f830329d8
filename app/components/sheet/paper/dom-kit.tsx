import type { CSSProperties } from "react";
import type { Kit, KitStyle } from "./kit.ts";

/** Styles are attributes, so that a file of the sheet needs no more than its fonts and a few lines about screens. */
const css = (style: KitStyle | undefined): CSSProperties | undefined => style;

/** The kit of the browser and of files that a browser opens. */
export const DOM_KIT: Kit = {
  Box: ({ style, role, label, span, className = "", scrolls = false, children }) => (
    <div
      className={`sheet-box ${scrolls ? "sheet-scroll" : className}`}
      style={css(style)}
      role={role}
      aria-label={label}
      aria-colspan={span}
      tabIndex={scrolls ? 0 : undefined}
    >
      {children}
    </div>
  ),
  Text: ({ style, as: Element = "p", className = "", children }) => (
    <Element className={`sheet-text ${className}`} style={css(style)}>
      {children}
    </Element>
  ),
  Run: ({ style, children }) => <span style={css(style)}>{children}</span>,
  Drawing: ({ width, height, className = "", children }) => (
    <div className={`sheet-drawing ${className}`} style={{ width: `${width}mm`, height: `${height}mm` }}>
      {children}
    </div>
  ),
};

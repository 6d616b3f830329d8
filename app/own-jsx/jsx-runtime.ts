import * as react from "react/jsx-runtime";
import { withOwnChildren } from "./own-children.ts";

export { Fragment, type JSX } from "react/jsx-runtime";

/**
 * React's own functions for elements, with figures in the reader's units: whatever component writes a quantity follows, and none can
 * forget to. `tsconfig.json` names this folder as what JSX is compiled to.
 */
export const jsx: typeof react.jsx = (type, props, key) => react.jsx(type, withOwnChildren(type, props), key);

export const jsxs: typeof react.jsxs = (type, props, key) => react.jsxs(type, withOwnChildren(type, props), key);

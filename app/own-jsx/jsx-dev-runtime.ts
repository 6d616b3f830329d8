import * as react from "react/jsx-dev-runtime";
import { withOwnChildren } from "./own-children.ts";

export { Fragment, type JSX } from "react/jsx-dev-runtime";

/** As `jsx-runtime`, while the program is worked on. */
export const jsxDEV: typeof react.jsxDEV = (type, props, ...more) =>
  react.jsxDEV(type, withOwnChildren(type, props), ...more);

import { createElement, Fragment, type ElementType } from "react";
import { OwnText } from "#app/components/units/OwnText.ts";
import { holdsQuantity } from "#app/lib/own-units.ts";

interface WithChildren {
  children?: unknown;
}

/** What may hold nothing but text, and choices of a form, which stay in what was stored. */
const VERBATIM = new Set(["title", "option", "textarea", "style", "script"]);

/**
 * The properties of an element with an `OwnText` for each text of its that holds a quantity. Elements of our own components are left:
 * what they draw comes by here as well. A number and its unit may be two neighbours of one element; they are taken together.
 */
export function withOwnChildren<Props>(type: ElementType | typeof Fragment, props: Props): Props {
  if (typeof type === "string" ? VERBATIM.has(type) : type !== Fragment) return props;
  const { children } = props as WithChildren;
  if (typeof children === "string") return holdsQuantity(children) ? { ...props, children: own(children) } : props;
  if (!Array.isArray(children) || !children.some(mayHold)) return props;
  return { ...props, children: joined(children) };
}

const own = (text: string) => createElement(OwnText, { text });

/** A no-break space tells a text with a quantity; its number may stand before it. */
const mayHold = (child: unknown) => typeof child === "string" && child.includes("\u00A0");

const isText = (child: unknown): child is string | number => typeof child === "string" || typeof child === "number";

/** The children with each run of texts that holds a quantity as one, in the place of its first; the others of it are empty. */
function joined(children: readonly unknown[]): unknown[] {
  const result = [...children];
  for (let start = 0; start < children.length; start += 1) {
    let end = start;
    while (end < children.length && isText(children[end])) end += 1;
    if (end === start) continue;
    const text = children.slice(start, end).join("");
    if (holdsQuantity(text)) result.fill(null, start, end).splice(start, 1, own(text));
    start = end;
  }
  return result;
}

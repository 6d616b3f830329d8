import { Fragment, cloneElement, isValidElement, type ReactNode } from "react";
import { bareInOwnUnits, changeOf, inOwnUnits, ownHead, type OwnUnits } from "#app/lib/own-units.ts";
import { useOwnUnits } from "./own-units-context.ts";

/** A text in the reader's units, for where no element is drawn: the names of drawings, what is measured before it is written. */
export function useOwnText(): (text: string) => string {
  const units = useOwnUnits();
  return (text) => inOwnUnits(text, units);
}

/** A unit that stands by itself, such as 'µm, k = 2' under the head of a column. */
export function OwnHead({ unit }: { unit: string }) {
  return ownHead(unit, useOwnUnits());
}

/** What stands in a column whose head is an `OwnHead`: every figure in it, however its elements lie within each other. */
export function OwnFigure({ unit, children }: { unit: string; children: ReactNode }) {
  const units = useOwnUnits();
  const [symbol = ""] = unit.split(",");
  return changeOf(symbol, units) ? figuresIn(children, symbol, units) : children;
}

function figuresIn(node: ReactNode, symbol: string, units: OwnUnits): ReactNode {
  if (typeof node === "string" || typeof node === "number") return bareInOwnUnits(String(node), symbol, units);
  if (Array.isArray(node))
    return node.map((each: ReactNode, index) => <Fragment key={index}>{figuresIn(each, symbol, units)}</Fragment>);
  if (!isValidElement<{ children?: ReactNode }>(node) || node.props.children === undefined) return node;
  return cloneElement(node, undefined, figuresIn(node.props.children, symbol, units));
}

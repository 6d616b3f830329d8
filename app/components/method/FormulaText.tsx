import { Fragment } from "react";

/** `_` with the letters and digits after it, or `^` with the bracket, number or letter after it. */
const MARK = /_([\p{L}\p{N}]+)|\^(?:\(([^()]*)\)|([−-]?\d+(?:\.\d+)?|\p{L}))/gu;

/** A formula or symbol of the engine, with its indices below and its powers above the line. */
export function FormulaText({ text }: { text: string }) {
  const parts = [];
  let from = 0;
  for (const match of text.matchAll(MARK)) {
    const [whole, below, bracket, power] = match;
    parts.push(
      <Fragment key={match.index}>
        {text.slice(from, match.index)}
        {below === undefined ? <sup>{bracket ?? power}</sup> : <sub>{below}</sub>}
      </Fragment>,
    );
    from = match.index + whole.length;
  }
  return (
    <>
      {parts}
      {text.slice(from)}
    </>
  );
}

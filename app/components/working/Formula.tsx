import { Fragment } from "react";

/** `_` with the letters and digits after it; `^` with the number, the letter or the bracket after it. */
const RAISED_OR_LOWERED = /_([\p{L}\p{N}]+)|\^(?:\(([^()]*)\)|([−-]?\d+(?:\.\d+)?|\p{L}))/gu;

/** A formula in the plain text of the engine's equations, its indices below the line and its powers above it. */
export function Formula({ text }: { text: string }) {
  const parts = [];
  let from = 0;
  for (const match of text.matchAll(RAISED_OR_LOWERED)) {
    const [whole, index, bracket, power] = match;
    parts.push(
      <Fragment key={match.index}>
        {text.slice(from, match.index)}
        {index === undefined ? <sup>{bracket ?? power}</sup> : <sub>{index}</sub>}
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

import { noBreak } from "#app/components/drawings/no-break.ts";
import type { CrossingWords } from "#app/schemas/comparison.ts";

/** More pairs that do not cross than this are folded away. */
const IN_SIGHT = 3;

/** Every two of those compared in words: where they warp alike first, then those that nowhere do. */
export function Crossings({ crossings }: { crossings: readonly CrossingWords[] }) {
  const crossing = crossings.filter(({ numbers }) => numbers.length > 0);
  const others = crossings.filter(({ numbers }) => numbers.length === 0);
  return (
    <>
      <List of={crossing} />
      {others.length <= IN_SIGHT ? (
        <List of={others} />
      ) : (
        <details className="mt-1">
          <summary className="link w-fit cursor-pointer">
            {crossing.length === 0 ? `None of the ${others.length} pairs` : `The other ${others.length} pairs nowhere`}
          </summary>
          <List of={others} />
        </details>
      )}
    </>
  );
}

function List({ of }: { of: readonly CrossingWords[] }) {
  if (of.length === 0) return null;
  return (
    <ul className="mt-1">
      {of.map(({ key, numbers, sentence }) => (
        <li key={key} className="py-0.5">
          {numbers.length > 0 ? <b>{numbers.join(", ")}: </b> : null}
          {noBreak(sentence)}
        </li>
      ))}
    </ul>
  );
}

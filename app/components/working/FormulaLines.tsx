import { Formula } from "./Formula.tsx";

/** Several relations, one a line; a comma inside brackets parts nothing. */
const linesOf = (formula: string) => formula.split(/, (?![^(]*\))/);

/** The formula of an equation, a relation a line; one that is too wide scrolls by itself. */
export function FormulaLines({ title, formula }: { title: string; formula: string }) {
  return (
    <div className="my-1 overflow-x-auto py-1" tabIndex={0} role="group" aria-label={`Formula: ${title}`}>
      {linesOf(formula).map((line) => (
        <p key={line} className="text-lead whitespace-nowrap">
          <Formula text={line} />
        </p>
      ))}
    </div>
  );
}

import { noBreak } from "#app/components/drawings/no-break.ts";
import type { Equation } from "#app/engine/equations.ts";
import { SOURCES, type Source, type SourceId } from "#app/engine/sources.ts";
import { FormulaText } from "./FormulaText.tsx";

/** One equation of the engine: formula, symbols with units, where it holds, where it comes from. */
export function EquationEntry({ id, equation }: { id: string; equation: Equation }) {
  const anchor = `equation-${id}`;
  return (
    <article
      aria-labelledby={anchor}
      className="grid gap-x-8 gap-y-2 border-t border-line py-4 first:border-0 first:pt-0 tablet:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]"
    >
      <div className="min-w-0">
        <h4 id={anchor} className="scroll-mt-4 font-semibold">
          {equation.title}
        </h4>
        <div className="my-1 overflow-x-auto py-1" tabIndex={0} role="region" aria-label={`Formula: ${equation.title}`}>
          {linesOf(equation.formula).map((line) => (
            <p key={line} className="text-lead whitespace-nowrap">
              <FormulaText text={line} />
            </p>
          ))}
        </div>
        <p>
          <b>Holds:</b> <Prose text={equation.range} />
        </p>
        {equation.caution && (
          <p className="mt-1">
            <b className="text-caution">Mind:</b> <Prose text={equation.caution} />
          </p>
        )}
        <p className="mt-1 text-label text-quiet">
          {equation.sources.map((source, index) => (
            <span key={source}>
              {index > 0 && "; "}
              <a href={`#source-${source}`} className="link">
                {shortName(source)}
              </a>
            </span>
          ))}
        </p>
      </div>
      <dl className="grid grid-cols-[minmax(3rem,auto)_minmax(0,1fr)] content-start gap-x-4 gap-y-0.5">
        {equation.symbols.map(({ symbol, meaning, unit }) => (
          <div key={symbol} className="contents">
            <dt className="whitespace-nowrap">
              <FormulaText text={symbol} />
            </dt>
            <dd className="text-quiet">
              <Prose text={unit === "1" ? meaning : `${meaning}, ${unit}`} />
            </dd>
          </div>
        ))}
      </dl>
    </article>
  );
}

/** A sentence in which symbols stand as they do in a formula. */
function Prose({ text }: { text: string }) {
  return <FormulaText text={noBreak(text)} />;
}

/** A formula of several relations, one a line; a comma inside brackets parts nothing. */
const linesOf = (formula: string) => formula.split(/, (?![^(]*\))/);

/** Family names and year, as in running text. */
function shortName(id: SourceId): string {
  const { author, year, title, basis }: Source = SOURCES[id];
  if (basis === "own derivation" || basis === "own computation") return basis;
  if (id === "common-practice") return "common practice, no source";
  if (year === null) return author === "SEMI" ? `SEMI ${title.slice(0, title.indexOf(","))}` : author;
  return `${author.replace(/\b\p{L}\.(?:-?\p{L}\.)* ?/gu, "").trim()} ${year}`;
}

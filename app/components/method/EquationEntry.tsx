import { noBreak } from "#app/components/drawings/no-break.ts";
import type { Equation } from "#app/engine/equations.ts";
import { Formula } from "#app/components/working/Formula.tsx";
import { FormulaLines } from "#app/components/working/FormulaLines.tsx";
import { shortCitation } from "#app/lib/short-citation.ts";

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
        <FormulaLines title={equation.title} formula={equation.formula} />
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
                {shortCitation(source)}
              </a>
            </span>
          ))}
        </p>
      </div>
      <dl className="grid grid-cols-[minmax(3rem,auto)_minmax(0,1fr)] content-start gap-x-4 gap-y-0.5">
        {equation.symbols.map(({ symbol, meaning, unit }) => (
          <div key={symbol} className="contents">
            <dt className="whitespace-nowrap">
              <Formula text={symbol} />
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
  return <Formula text={noBreak(text)} />;
}

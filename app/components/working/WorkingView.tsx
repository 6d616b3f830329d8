import type { WorkingLine } from "#app/engine/working.ts";
import { formatInUnit } from "#app/lib/format-unit.ts";
import type { ShownWorking } from "#app/lib/shown-working.ts";
import { Formula } from "./Formula.tsx";
import { FormulaLines } from "./FormulaLines.tsx";

const HEADINGS: Record<number, "h2" | "h3" | "h4" | "h5"> = { 2: "h2", 3: "h3", 4: "h4", 5: "h5" };

export interface WorkingViewProps {
  working: ShownWorking;
  /** level of its heading; the calculations that it rests on stand one below, down to the sixth */
  level?: number;
}

/**
 * The calculation behind a figure: the equation, what went in with unit and source, what came out, where it holds, and the
 * calculations that it rests on.
 */
export function WorkingView({ working, level = 3 }: WorkingViewProps) {
  const { title, formula, remark, sources, inputs, result, from = [] } = working;
  const Heading = HEADINGS[level] ?? "h6";
  return (
    <section>
      <Heading className="font-semibold">{title}</Heading>
      <FormulaLines title={title} formula={formula} />
      <div className="overflow-x-auto" tabIndex={0} role="group" aria-label={`Figures: ${title}`}>
        <table className="table">
          <caption className="sr-only">{title}</caption>
          <thead>
            <tr>
              <th scope="col">Symbol</th>
              <th scope="col">Meaning</th>
              <th scope="col" className="num">
                Value
              </th>
            </tr>
          </thead>
          <tbody>
            {inputs.map((line) => (
              <Line key={line.symbol} line={line} />
            ))}
            <Line line={result} result />
          </tbody>
        </table>
      </div>
      <p className="mt-2 text-label text-quiet">
        <Formula text={remark} />
      </p>
      <p className="mt-1 text-label text-quiet">Sources: {sources.join("; ")}.</p>
      {from.length > 0 && (
        <div className="mt-3 space-y-4 border-l border-edge pl-4">
          {from.map((part, index) => (
            <WorkingView key={index} working={part} level={level + 1} />
          ))}
        </div>
      )}
    </section>
  );
}

function Line({ line, result = false }: { line: WorkingLine; result?: boolean }) {
  const { symbol, meaning, value, unit, temperaturePoint, source } = line;
  return (
    <tr className={result ? "font-semibold" : undefined}>
      <th scope="row" className={`whitespace-nowrap ${result ? "font-semibold" : "font-normal"}`}>
        <Formula text={symbol} />
      </th>
      <td>
        {meaning}
        {source !== undefined && <span className="block text-label font-normal text-quiet">{source}</span>}
      </td>
      <td className="num">{formatInUnit(value, unit, temperaturePoint)}</td>
    </tr>
  );
}

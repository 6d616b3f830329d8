import { Link } from "react-router";
import { FormulaText } from "#app/components/method/FormulaText.tsx";
import { EQUATIONS } from "#app/engine/equations.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { UnitSymbol, Working } from "#app/engine/working.ts";

const DIMENSIONS: Partial<Record<UnitSymbol, Dimension>> = { m: "length", Pa: "stress", "1/m": "curvature" };

/** The calculation behind the stress: equation, what went in, what came out. */
export function ScanWorking({ working }: { working: Working }) {
  const equation = EQUATIONS[working.equation];
  return (
    <section id="working" aria-labelledby="working-title" className="scroll-mt-4">
      <h2 id="working-title" className="font-semibold">
        Working
      </h2>
      <p className="mt-2 text-lead">
        <FormulaText text={equation.formula} />
      </p>
      <table className="table mt-1">
        <caption className="sr-only">What went in and what came out</caption>
        <thead className="sr-only">
          <tr>
            <th scope="col">Symbol</th>
            <th scope="col">Meaning</th>
            <th scope="col">Value</th>
          </tr>
        </thead>
        <tbody>
          {[...working.inputs, working.result].map(({ symbol, meaning, value, unit }) => (
            <tr key={symbol}>
              <th scope="row" className="font-normal whitespace-nowrap">
                <FormulaText text={symbol} />
              </th>
              <td className="text-quiet">{meaning}</td>
              <td className="num">
                {formatQuantity(value, DIMENSIONS[unit] ?? "number", { significant: 5, trim: true })}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {working.note && <p className="mt-2 text-quiet">{working.note}</p>}
      <p className="mt-1">
        <Link to={`/method#equation-${working.equation}`} className="link">
          Where this relation holds
        </Link>
      </p>
    </section>
  );
}

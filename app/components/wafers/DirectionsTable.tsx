import { formatWithUncertainty } from "#app/engine/units/format.ts";
import { angleText } from "#app/lib/angle-text.ts";
import { withoutUnit } from "#app/lib/format-measured.ts";
import type { Directions, Expanded, FilmAnalysis } from "#app/schemas/film-analysis.ts";

const ROWS = [
  ["change", "Change by the film"],
  ["before", "Before the film"],
  ["after", "After the film"],
] as const;

/** Curvatures towards the notch and across it, the principal ones and their axis, in figures and in words. */
export function DirectionsTable({ directions }: { directions: FilmAnalysis["directions"] }) {
  return (
    <section aria-labelledby="directions">
      <h2 id="directions" className="font-semibold">
        Curvature in all directions
      </h2>
      <ul className="mt-1 mb-2 max-w-240">
        {ROWS.map(([key, name]) => (
          <li key={key}>
            {name}: <b>{wordOf(directions[key])}</b> <span className="text-quiet">{directions[key].sentence}</span>
          </li>
        ))}
      </ul>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Curvatures">
        <table className="table">
          <caption className="sr-only">Curvatures, 1/km</caption>
          <thead>
            <tr>
              <th scope="col">1/km, k = 2</th>
              <th scope="col" className="num">
                Mean
              </th>
              <th scope="col" className="num">
                Towards notch, k<sub>x</sub>
              </th>
              <th scope="col" className="num">
                Across, k<sub>y</sub>
              </th>
              <th scope="col" className="num">
                Largest
              </th>
              <th scope="col" className="num">
                Across that
              </th>
              <th scope="col" className="num">
                Axis
              </th>
            </tr>
          </thead>
          <tbody>
            {ROWS.map(([key, name]) => (
              <Row key={key} name={name} directions={directions[key]} />
            ))}
          </tbody>
        </table>
      </div>
      <p className="mt-1 text-label text-quiet">
        Bowl positive, device side up; angles from the notch, counter-clockwise seen on the device side.
      </p>
    </section>
  );
}

function wordOf({ all }: Directions): string {
  return all ? all.word : "not told in all directions.";
}

function Row({ name, directions: { mean, all } }: { name: string; directions: Directions }) {
  const cell = (value: Expanded | undefined) =>
    value ? withoutUnit(formatWithUncertainty(value.value, value.uncertainty, "curvature", { unit: "1/km" })) : "–";
  return (
    <tr>
      <th scope="row" className="font-normal">
        {name}
      </th>
      <td className="num">{cell(mean)}</td>
      <td className="num">{cell(all?.x)}</td>
      <td className="num">{cell(all?.y)}</td>
      <td className="num">{cell(all?.major)}</td>
      <td className="num">{cell(all?.minor)}</td>
      <td className="num">
        {all
          ? all.angleTold
            ? `${angleText(all.angle.value)} ± ${angleText(all.angle.uncertainty)}`
            : "not told"
          : "–"}
      </td>
    </tr>
  );
}

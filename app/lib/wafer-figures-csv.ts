import type { Expanded, FilmAnalysis } from "#app/schemas/film-analysis.ts";
import { csvOf, type CsvMark } from "./csv.ts";

const HEAD = ["wafer", "film", "figure", "of", "value", "expanded_uncertainty_k2", "unit", "definition"];

/** The figures of a film on a wafer, SI and in full precision, one a row, each with what it is. */
export function waferFiguresCsv(wafer: string, film: string, analysis: FilmAnalysis, mark?: CsvMark): string {
  const { stress, directional, directions, shape } = analysis;
  type Row = [figure: string, of: string, value: number, uncertainty: number | "", unit: string, definition: string];
  const row = (figure: string, of: string, { value, uncertainty }: Expanded, unit: string, definition = ""): Row => [
    figure,
    of,
    value,
    uncertainty,
    unit,
    definition,
  ];
  const rows: Row[] = [
    row("film stress", "thin-film relation", stress.stoney, "Pa", "tension positive"),
    ...(stress.full ? [row("film stress", "full model", stress.full, "Pa", "tension positive")] : []),
    ...(["x", "y", "shear", "high", "low"] as const).flatMap((key): Row[] =>
      directional
        ? [["film stress", key, directional[key], "", "Pa", "x towards the notch; high and low: principal"]]
        : [],
    ),
    ...(["change", "before", "after"] as const).flatMap((of) => {
      const { mean, all } = directions[of];
      return [
        row("curvature, mean", of, mean, "1/m", "bowl positive"),
        ...(["x", "y", "twist", "major", "minor"] as const).flatMap((key) =>
          all ? [row(`curvature, ${key}`, of, all[key], "1/m", "x towards the notch")] : [],
        ),
      ];
    }),
    ...("shapes" in shape
      ? shape.shapes.flatMap(({ of, figures }) =>
          figures.map(({ name, value, definition, source }) => row(name, of, value, "m", `${definition} ${source}`)),
        )
      : []),
  ];
  return csvOf([HEAD, ...rows.map((cells) => [wafer, film, ...cells])], mark);
}

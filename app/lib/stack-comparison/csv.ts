import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { csvOf, type CsvMark } from "../csv.ts";
import type { ComparedStack } from "./figures.ts";

const HEAD = ["part", "stack", "film", "quantity", "silicon_thickness_um", "value", "unit"];

type Row = (string | number)[];

const micro = (si: number) => Number((si * 1e6).toPrecision(12));
const mega = (si: number) => Number((si / 1e6).toPrecision(12));

/**
 * A comparison as CSV, one value a row: inputs, then figures, then curves.
 */
export function comparisonCsv(stacks: readonly ComparedStack[], mark?: CsvMark): string {
  const rows = [...stacks.flatMap(inputRows), ...stacks.flatMap(figureRows), ...stacks.flatMap(curveRows)];
  return csvOf([HEAD, ...rows], mark);
}

/** Two programs may have a stack of the same name: the letter tells the columns apart. */
const nameOf = ({ letter, name }: ComparedStack) => `${letter} ${name}`;

function inputRows(stack: ComparedStack): Row[] {
  const { silicon, siliconThickness, layers } = stack;
  const row = (film: string, quantity: string, value: string | number, unit: string): Row => [
    "input",
    nameOf(stack),
    film,
    quantity,
    "",
    value,
    unit,
  ];
  const given = (film: string, quantity: string, value: number | null, unit: string) =>
    value === null ? [] : [row(film, quantity, value, unit)];
  return [
    row("", "program", stack.program.name, ""),
    row("", "silicon", silicon.name, ""),
    row("", "diameter", Number((silicon.diameter * 1e3).toPrecision(12)), "mm"),
    row("", "silicon thickness", micro(siliconThickness.value), "um"),
    ...given("", "silicon thickness tolerance", siliconThickness.tolerance && micro(siliconThickness.tolerance), "um"),
    ...layers.flatMap(({ side, filmName, thickness, stress, coverage, lines }, n) => {
      const film = `${n + 1} ${side} ${filmName}`;
      return [
        row(film, "thickness", micro(thickness.value), "um"),
        ...given(film, "thickness tolerance", thickness.tolerance && micro(thickness.tolerance), "um"),
        row(film, "stress at 25 C", mega(stress.value), "MPa"),
        ...given(film, "stress tolerance", stress.tolerance && mega(stress.tolerance), "MPa"),
        row(film, "stress source", stress.source, ""),
        row(film, "area coverage", Number(coverage.toPrecision(12)), "1"),
        ...given(film, "line width", lines ? micro(lines.width) : null, "um"),
        ...given(film, "line direction", lines ? Number(lines.direction.toPrecision(12)) : null, "rad"),
      ];
    }),
  ];
}

function figureRows(stack: ComparedStack): Row[] {
  const { figures, layers } = stack;
  const row = (film: string, quantity: string, at: string | number, value: string | number, unit: string): Row => [
    "figure",
    nameOf(stack),
    film,
    quantity,
    at,
    value,
    unit,
  ];
  if (!figures) return [row("", "remark", "", "cannot be estimated", "")];
  const { request, answer } = figures.estimated;
  const own = micro(request.wafer.thickness_m);
  const { shape, support, curls_below_m } = answer;
  const uncertainty = shape.warp_linear && !figures.own.rolledUp ? shape.warp_standard_uncertainty_m : null;
  return [
    row("", "engine version", "", answer.engine_version, ""),
    row("", "temperature", "", request.temperature_K ?? ROOM_TEMPERATURE, "K"),
    ...(shape.regime === "curled" ? [] : [row("", "bow", own, micro(shape.bow_m), "um")]),
    ...(figures.bowUncertainty === null || shape.regime === "curled"
      ? []
      : [row("", "bow standard uncertainty", own, micro(figures.bowUncertainty), "um")]),
    figures.own.rolledUp
      ? row("", "warp", own, "rolled past half a turn", "")
      : row("", "warp", own, micro(shape.warp_m), "um"),
    ...(uncertainty === null ? [] : [row("", "warp standard uncertainty", own, micro(uncertainty), "um")]),
    row("", "regime", own, shape.regime, ""),
    ...(curls_below_m === null ? [] : [row("", "curls below", "", micro(curls_below_m), "um")]),
    row("", "support to lift it", own, support.class ?? "cannot be judged", ""),
    ...figures.warpAt.flatMap(({ thickness, warp, regime, rolledUp }) => [
      rolledUp
        ? row("", "warp", micro(thickness), "rolled past half a turn", "")
        : row("", "warp", micro(thickness), micro(warp), "um"),
      row("", "regime", micro(thickness), regime, ""),
    ]),
    ...layers.map(({ side, filmName }, n) =>
      row(
        `${n + 1} ${side} ${filmName}`,
        "force per width",
        "",
        Number((figures.pulls[n] ?? 0).toPrecision(12)),
        "N/m",
      ),
    ),
  ];
}

function curveRows(stack: ComparedStack): Row[] {
  return (stack.figures?.estimated.answer.sweep ?? []).map(({ thickness_m, warp_m }) => [
    "curve",
    nameOf(stack),
    "",
    "warp",
    micro(thickness_m),
    micro(warp_m),
    "um",
  ]);
}

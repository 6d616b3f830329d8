import type { StepResult } from "#app/schemas/assessment-result.ts";
import { csvOf, type CsvMark } from "../csv.ts";
import { isRolled } from "../lying-as.ts";
import { thinningCurve } from "./curve.ts";
import type { ComparedFlow, FlowFigures } from "./figures.ts";
import { toleranceWords } from "./sensitivities.ts";

const HEAD = ["part", "flow", "step", "title", "quantity", "silicon_thickness_um", "value", "unit"];

type Row = (string | number)[];

const micro = (si: number) => Number((si * 1e6).toPrecision(12));

/** A comparison of flows as CSV, one value a row: figures, then steps, then what moves the warp, then curves over their whole range. */
export function flowComparisonCsv(flows: readonly ComparedFlow[], mark?: CsvMark): string {
  const rows = [figureRows, stepRows, moverRows, curveRows].flatMap((part) =>
    flows.flatMap((flow) => (flow.figures ? part(flow, flow.figures) : [])),
  );
  return csvOf([HEAD, ...flows.flatMap(headRows), ...rows], mark);
}

/** Two programs may have a flow of the same name: the letter tells the columns apart. */
const nameOf = ({ letter, name }: ComparedFlow) => `${letter} ${name}`;

function headRows(flow: ComparedFlow): Row[] {
  const { program, silicon, changedAt, assessed, reason } = flow;
  const row = (quantity: string, value: string | number, unit = ""): Row => [
    "input",
    nameOf(flow),
    "",
    "",
    quantity,
    "",
    value,
    unit,
  ];
  return [
    row("program", program.name),
    row("silicon", silicon.name),
    row("diameter", Number((silicon.diameter * 1e3).toPrecision(12)), "mm"),
    row("flow last changed", changedAt),
    row("newest assessment", assessed ? `${assessed.revision}, ${assessed.date}` : "none"),
    ...(assessed ? [row("newest assessment out of date", assessed.outOfDate ? "yes" : "no")] : []),
    ...(reason === null ? [] : [row("remark", `cannot be walked: ${reason}`)]),
  ];
}

function figureRows(flow: ComparedFlow, { result, deciding }: FlowFigures): Row[] {
  const row = (step: number | "", quantity: string, value: string | number, unit = ""): Row => [
    "figure",
    nameOf(flow),
    step,
    step === "" ? "" : titleOf(result.steps, step),
    quantity,
    "",
    value,
    unit,
  ];
  const { outcome, step } = result.verdict;
  return [
    row(step ?? "", "verdict", outcome),
    ...(result.slots ? [row("", "slots", result.slots.join(" "))] : []),
    ...(deciding?.limit
      ? [
          row(deciding.judgedAt, "tightest warp", micro(deciding.warp), "um"),
          row(deciding.judgedAt, "limit of its tool", micro(deciding.limit.value), "um"),
        ]
      : []),
    row("", "assumed inputs", result.assumed.length, "1"),
    row("", "inputs", result.inputs, "1"),
  ];
}

const titleOf = (steps: readonly StepResult[], number: number) =>
  steps.find((step) => step.number === number)?.title ?? "";

function stepRows(flow: ComparedFlow, { result }: FlowFigures): Row[] {
  return result.steps.flatMap((step) => {
    const row = (quantity: string, value: string | number, unit = ""): Row => [
      "step",
      nameOf(flow),
      step.number,
      step.title,
      quantity,
      micro(step.silicon),
      value,
      unit,
    ];
    if (step.skipped) return [row("skipped", "yes")];
    const { atRoom } = step;
    return [
      row("kind", step.kind),
      row("outcome", step.outcome),
      row("support required", step.required),
      row("support planned", step.planned),
      row("highest temperature", step.peakTemperature, "K"),
      ...(atRoom
        ? [
            row(isRolled(atRoom) ? "edge lift at 25 C" : "warp at 25 C", micro(atRoom.warp), "um"),
            row("edges", atRoom.edgesUp ? "up" : "down"),
          ]
        : []),
    ];
  });
}

function moverRows(flow: ComparedFlow, { deciding, movers, result }: FlowFigures): Row[] {
  const number = deciding?.step.number;
  return movers.map(({ unknown, moves }) => [
    "mover",
    nameOf(flow),
    number ?? "",
    number === undefined ? "" : titleOf(result.steps, number),
    `${unknown.label} (${toleranceWords(unknown).replaceAll("\u00A0", " ").replace("± ", "+/- ")})`,
    "",
    micro(moves),
    "um",
  ]);
}

function curveRows(flow: ComparedFlow, { thinning }: FlowFigures): Row[] {
  if (!thinning) return [];
  return thinningCurve(flow, thinning, thinning.range).points.map(({ x, y }) => [
    "curve",
    nameOf(flow),
    "",
    "",
    "warp let go at 25 C",
    micro(x),
    micro(y),
    "um",
  ]);
}

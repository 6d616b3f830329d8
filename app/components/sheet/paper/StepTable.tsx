import type { ReactNode } from "react";
import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { OUTCOME_SIGNS, SUPPORT_SIGNS } from "#app/components/drawings/severity.ts";
import type { Paper } from "#app/lib/paper-size.ts";
import { STEP_COLUMNS, STEP_ROW, titleColumn } from "#app/lib/sheet/paper-geometry.ts";
import { hottestLines, stepHeight } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetStepRow } from "#app/schemas/sheet-document.ts";
import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit } from "./kit.ts";
import { Sign } from "./signs.tsx";

interface Props {
  kit: Kit;
  steps: readonly SheetStepRow[];
  paper: Paper;
  /** of the wafer, m */
  diameter: number;
  exaggeration: number;
}

/** The steps with their figures; a heavier rule where what holds the wafer changes. */
export function StepTable({ kit, steps, paper, diameter, exaggeration }: Props) {
  const { Box, Text } = kit;
  const title = titleColumn(paper);
  const heads: readonly [lines: readonly string[], width: number, right?: boolean][] = [
    [["Step"], STEP_COLUMNS.number, true],
    [["What is done"], title],
    [["Silicon", "µm"], STEP_COLUMNS.silicon, true],
    [["Hottest", "°C"], STEP_COLUMNS.hottest, true],
    [["Held by"], STEP_COLUMNS.heldBy],
    [["Bow line", `×${exaggeration}`], STEP_COLUMNS.bow],
    [["Warp at 25\u00A0°C", "as it lies, µm"], STEP_COLUMNS.warp, true],
    [["Limit", "µm"], STEP_COLUMNS.limit, true],
    [["Finding"], STEP_COLUMNS.finding],
  ];
  return (
    <Box role="region" label="Step table" scrolls>
      <Box role="table" label="Steps with their figures">
        <Box role="rowgroup">
          <Box
            role="row"
            style={{
              flexDirection: "row",
              alignItems: "flex-end",
              height: mm(STEP_ROW.head),
              borderBottomWidth: mm(0.35),
              borderTopWidth: mm(0.25),
              borderColor: PAPER_COLOURS.ink,
            }}
          >
            {heads.map(([lines, width, right], index) => (
              <Box
                key={index}
                role="columnheader"
                style={{
                  width: mm(width),
                  paddingLeft: mm(STEP_ROW.padX),
                  paddingRight: mm(STEP_ROW.padX),
                  paddingBottom: mm(0.4),
                }}
              >
                {lines.map((line) => (
                  <Text key={line} style={{ ...TYPE.head, textAlign: right ? "right" : "left" }}>
                    {line}
                  </Text>
                ))}
              </Box>
            ))}
          </Box>
        </Box>
        <Box role="rowgroup" style={{ borderBottomWidth: mm(0.35), borderColor: PAPER_COLOURS.ink }}>
          {steps.map((step, index) => (
            <Row
              key={step.number}
              kit={kit}
              step={step}
              paper={paper}
              diameter={diameter}
              exaggeration={exaggeration}
              first={index === 0}
            />
          ))}
        </Box>
      </Box>
    </Box>
  );
}

function Row({
  kit,
  step,
  paper,
  diameter,
  exaggeration,
  first,
}: Omit<Props, "steps"> & { step: SheetStepRow; first: boolean }) {
  const { Box, Text, Drawing } = kit;
  const outcome = OUTCOME_SIGNS[step.outcome];
  const right = { ...TYPE.table, textAlign: "right" } as const;
  const rule = step.newSupport
    ? { width: 0.35, colour: PAPER_COLOURS.ink }
    : { width: 0.2, colour: PAPER_COLOURS.cell };
  return (
    <Box
      role="row"
      style={{
        flexDirection: "row",
        height: mm(stepHeight(step, paper)),
        borderTopWidth: first ? 0 : mm(rule.width),
        borderColor: rule.colour,
      }}
    >
      <Cell kit={kit} width={STEP_COLUMNS.number} role="rowheader" first>
        <Text style={{ ...right, ...BOLD }}>{String(step.number)}</Text>
      </Cell>
      <Cell kit={kit} width={titleColumn(paper)}>
        <Text style={TYPE.table}>{step.title}</Text>
      </Cell>
      <Cell kit={kit} width={STEP_COLUMNS.silicon}>
        <Text style={right}>{step.silicon}</Text>
      </Cell>
      <Cell kit={kit} width={STEP_COLUMNS.hottest}>
        {hottestLines(step).map((line) => (
          <Text key={line} style={right}>
            {line}
          </Text>
        ))}
      </Cell>
      <Cell kit={kit} width={STEP_COLUMNS.heldBy}>
        <Box style={{ flexDirection: "row", alignItems: "center", columnGap: mm(1) }}>
          <Sign kit={kit} level={SUPPORT_SIGNS[step.support].level} />
          <Box style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0 }}>
            <Text style={step.support === "bare" ? TYPE.table : { ...TYPE.table, ...BOLD }}>{step.heldBy}</Text>
          </Box>
        </Box>
      </Cell>
      <Cell kit={kit} width={STEP_COLUMNS.bow}>
        <Drawing width={STEP_ROW.bow.width} height={STEP_ROW.bow.height}>
          <BowLine
            label=""
            width={60}
            height={25.6}
            margin={3}
            diameter={diameter}
            {...step.bow}
            exaggeration={exaggeration}
            showScale={step.bow.shape.kind === "rolled"}
          />
        </Drawing>
      </Cell>
      <Cell kit={kit} width={STEP_COLUMNS.warp}>
        <Text style={right}>{step.warp}</Text>
        <Text style={{ ...right, color: PAPER_COLOURS.quiet }}>{step.lies}</Text>
      </Cell>
      <Cell kit={kit} width={STEP_COLUMNS.limit}>
        <Text style={right}>{step.limit}</Text>
      </Cell>
      <Cell kit={kit} width={STEP_COLUMNS.finding}>
        <Box style={{ flexDirection: "row", alignItems: "center", columnGap: mm(1) }}>
          <Sign kit={kit} level={outcome.level} />
          <Text style={step.outcome === "clear" ? TYPE.table : { ...TYPE.table, ...BOLD }}>{outcome.word}</Text>
        </Box>
        {step.finding === null ? null : <Text style={TYPE.table}>{step.finding}</Text>}
      </Cell>
    </Box>
  );
}

interface CellProps {
  kit: Kit;
  width: number;
  role?: "cell" | "rowheader";
  first?: boolean;
  children: ReactNode;
}

function Cell({ kit, width, role = "cell", first = false, children }: CellProps) {
  const { Box } = kit;
  return (
    <Box
      role={role}
      style={{
        width: mm(width),
        justifyContent: "center",
        paddingLeft: mm(STEP_ROW.padX),
        paddingRight: mm(STEP_ROW.padX),
        borderLeftWidth: first ? 0 : mm(0.2),
        borderColor: PAPER_COLOURS.cell,
      }}
    >
      {children}
    </Box>
  );
}

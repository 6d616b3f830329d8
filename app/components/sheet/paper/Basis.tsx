import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import { sheetPlot } from "#app/components/drawings/sheet-plot.ts";
import type { Paper } from "#app/lib/paper-size.ts";
import { BASIS, INSET } from "#app/lib/sheet/paper-geometry.ts";
import { basisColumns } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetEngineers } from "#app/schemas/sheet-document.ts";
import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit } from "./kit.ts";

const PX_PER_MM = 96 / 25.4;

interface Props {
  kit: Kit;
  engineers: SheetEngineers;
  paper: Paper;
  /** has a page to itself, so that its plot may be larger */
  alone: boolean;
}

/** What the figures rest on: warp against thickness with what the figures mean, what changed, and what is assumed. */
export function Basis({ kit, engineers, paper, alone }: Props) {
  const { Box, Text, Drawing } = kit;
  const { plot, noPlot, meaning, remarks, changes, assumptions, signs } = engineers;
  const columns = basisColumns(paper);
  const height = alone ? BASIS.plot.alone : BASIS.plot.height;
  return (
    <Box
      className="sheet-stack"
      style={{
        flexDirection: "row",
        flexGrow: 1,
        borderTopWidth: alone ? mm(0.25) : 0,
        borderColor: PAPER_COLOURS.ink,
      }}
    >
      <Box
        style={{ width: mm(columns.plot), paddingTop: mm(BASIS.pad), paddingLeft: mm(INSET), paddingRight: mm(INSET) }}
      >
        <Heading kit={kit}>Why: warp against silicon thickness</Heading>
        {plot ? (
          <Drawing width={BASIS.plot.width} height={height} className="sheet-wide">
            <PrintPlot
              plot={sheetPlot(plot)}
              label={plot.label}
              width={BASIS.plot.width * PX_PER_MM}
              height={height * PX_PER_MM}
              textSize={10.5}
            />
          </Drawing>
        ) : (
          <Text style={TYPE.table}>{noPlot}</Text>
        )}
        <Box style={{ paddingTop: mm(0.8) }}>
          <Text style={{ ...TYPE.table, color: PAPER_COLOURS.quiet }}>{meaning}</Text>
        </Box>
      </Box>
      <Box
        style={{
          width: mm(columns.words),
          paddingTop: mm(BASIS.pad),
          paddingLeft: mm(INSET),
          paddingRight: mm(INSET),
          borderLeftWidth: mm(0.25),
          borderColor: PAPER_COLOURS.ink,
        }}
      >
        <List kit={kit} heading="Changed since the last revision" lines={changes} />
        <List kit={kit} heading="Figures that rest on an assumption" lines={assumptions} />
        <List kit={kit} heading="Reading the bow lines" lines={[signs]} />
        <List kit={kit} heading="Made with" lines={remarks} />
      </Box>
    </Box>
  );
}

function Heading({ kit: { Box, Text }, children }: { kit: Kit; children: string }) {
  return (
    <Box style={{ height: mm(BASIS.heading) }}>
      <Text as="h3" style={{ ...TYPE.value, ...BOLD }}>
        {children}
      </Text>
    </Box>
  );
}

function List({ kit, heading, lines }: { kit: Kit; heading: string; lines: readonly string[] }) {
  const { Box, Text } = kit;
  if (lines.length === 0) return null;
  return (
    <Box style={{ paddingBottom: mm(BASIS.pad) }}>
      <Heading kit={kit}>{heading}</Heading>
      {lines.map((line) => (
        <Box key={line} style={{ paddingLeft: mm(3) }}>
          <Box
            style={{
              position: "absolute",
              top: mm(1.8),
              left: 0,
              width: mm(1.6),
              borderTopWidth: mm(0.25),
              borderColor: PAPER_COLOURS.ink,
            }}
          />
          <Text style={TYPE.table}>{line}</Text>
        </Box>
      ))}
    </Box>
  );
}

import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { SUPPORT_SIGNS } from "#app/components/drawings/severity.ts";
import { GROUP, GROUP_COLUMNS } from "#app/lib/sheet/paper-geometry.ts";
import { isLongHead, NO_DO_NOT, waferLines } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetHands } from "#app/schemas/sheet-document.ts";
import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit, type KitStyle } from "./kit.ts";
import { Sign } from "./signs.tsx";

type Group = SheetHands["groups"][number];

interface Props {
  kit: Kit;
  groups: readonly Group[];
  /** width inside the frame, mm */
  frame: number;
  /** of the wafer, m */
  diameter: number;
  exaggeration: number;
}

const HEADS = [
  ["The wafer", "wafer"],
  ["Stop at", "stop"],
  ["Do not", "doNot"],
  ["Initials", "initials"],
] as const;

/** Steps grouped by what holds the wafer: what it is like there, the reading that means stop, and what not to do. */
export function HandsGroups({ kit, groups, frame, diameter, exaggeration }: Props) {
  const { Box, Text } = kit;
  const column = (key: keyof typeof GROUP_COLUMNS) => mm((frame * GROUP_COLUMNS[key]) / 100);
  return (
    <Box role="table" label="Steps grouped by what holds the wafer">
      <Box role="rowgroup" className="sheet-paper-only">
        <Box role="row" style={{ flexDirection: "row", borderBottomWidth: mm(0.35), borderColor: PAPER_COLOURS.ink }}>
          {HEADS.map(([head, key], index) => (
            <Box
              key={key}
              role="columnheader"
              style={{
                width: column(key),
                paddingTop: mm(0.5),
                paddingBottom: mm(0.5),
                paddingLeft: mm(index === 3 ? 0.5 : GROUP.padX),
                borderLeftWidth: index === 0 ? 0 : mm(0.2),
                borderColor: PAPER_COLOURS.cell,
              }}
            >
              <Text style={TYPE.value}>{head}</Text>
            </Box>
          ))}
        </Box>
      </Box>
      {groups.map((group) => (
        <Box
          key={group.steps}
          role="rowgroup"
          style={{ flexDirection: "row", borderBottomWidth: mm(0.35), borderColor: PAPER_COLOURS.ink }}
        >
          <Box className="sheet-wide" style={{ width: mm((frame * (100 - GROUP_COLUMNS.initials)) / 100) }}>
            <Box role="row">
              <Box role="rowheader" span={4}>
                <GroupHead kit={kit} group={group} frame={frame} diameter={diameter} exaggeration={exaggeration} />
              </Box>
            </Box>
            <Box role="row" className="sheet-stack" style={{ flexDirection: "row" }}>
              <Cell kit={kit} width={column("wafer")}>
                {waferLines(group).map((line) => (
                  <Text key={line} style={TYPE.body}>
                    {line}
                  </Text>
                ))}
              </Cell>
              <Cell kit={kit} width={column("stop")}>
                {group.stop.lines.map((line) => (
                  <Text key={line} style={{ ...TYPE.body, ...BOLD }}>
                    {line}
                  </Text>
                ))}
                <Text style={TYPE.body}>{group.stop.how}</Text>
              </Cell>
              <Cell kit={kit} width={column("doNot")}>
                {group.doNot.length === 0 ? (
                  <Text style={TYPE.body}>{NO_DO_NOT}</Text>
                ) : (
                  group.doNot.map((line) => <DoNot key={line} kit={kit} line={line} />)
                )}
              </Cell>
            </Box>
          </Box>
          <Box
            className="sheet-paper-only"
            style={{ width: column("initials"), borderLeftWidth: mm(0.2), borderColor: PAPER_COLOURS.cell }}
          />
        </Box>
      ))}
    </Box>
  );
}

function Cell({ kit, width, children }: { kit: Kit; width: KitStyle["width"]; children: React.ReactNode }) {
  const { Box } = kit;
  return (
    <Box
      role="cell"
      style={{ width, paddingLeft: mm(GROUP.padX), paddingRight: mm(GROUP.padX), paddingBottom: mm(GROUP.padBottom) }}
    >
      {children}
    </Box>
  );
}

function DoNot({ kit, line }: { kit: Kit; line: string }) {
  const { Box, Text } = kit;
  return (
    <Box style={{ paddingLeft: mm(GROUP.marker) }}>
      <Box
        style={{
          position: "absolute",
          top: mm(2.3),
          left: 0,
          width: mm(1.6),
          borderTopWidth: mm(0.3),
          borderColor: PAPER_COLOURS.ink,
        }}
      />
      <Text style={TYPE.body}>{line}</Text>
    </Box>
  );
}

function GroupHead({ kit, group, frame, diameter, exaggeration }: Omit<Props, "groups"> & { group: Group }) {
  const { Box, Text, Drawing } = kit;
  const { steps, support, heldBy, sideUp, bow } = group;
  const sign = SUPPORT_SIGNS[support];
  const { width, height } = GROUP.bow;
  const long = isLongHead(group, frame);
  return (
    <Box
      style={{
        flexDirection: "row",
        flexWrap: "wrap",
        alignItems: "center",
        columnGap: mm(3.2),
        minHeight: mm(GROUP.head),
        paddingLeft: mm(GROUP.padX),
        paddingRight: mm(1),
      }}
    >
      <Text style={{ ...TYPE.group, ...BOLD }}>{`${/^\d+$/.test(steps) ? "Step" : "Steps"} ${steps}`}</Text>
      <Box style={{ flexDirection: "row", alignItems: "center", columnGap: mm(1.4) }}>
        <Sign kit={kit} level={sign.level} />
        <Text style={support === "bare" ? TYPE.body : { ...TYPE.body, ...BOLD }}>{sign.word}</Text>
      </Box>
      {heldBy === null ? null : <Text style={long ? { ...TYPE.body, flexShrink: 1 } : TYPE.body}>{heldBy}</Text>}
      <Text style={{ ...TYPE.body, ...BOLD }}>{sideUp}</Text>
      <Box style={{ flexGrow: 1, alignItems: "flex-end" }}>
        <Drawing width={width} height={height}>
          <BowLine
            label=""
            width={92}
            height={23}
            diameter={diameter}
            {...bow}
            exaggeration={exaggeration}
            showScale={bow.shape.kind !== "held"}
          />
        </Drawing>
      </Box>
    </Box>
  );
}

import { INSET, RECORD } from "#app/lib/sheet/paper-geometry.ts";
import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit } from "./kit.ts";

/** Columns in parts of a whole. */
const COLUMNS = [
  ["Step", 1],
  ["Wafer", 1.6],
  ["Bow, µm", 1.8],
  ["How, and what was seen", 5.6],
  ["Date", 1.8],
  ["By", 1.4],
] as const;

/** Room to write down what was measured and seen. */
export function Record({ kit, rows }: { kit: Kit; rows: number }) {
  const { Box, Text } = kit;
  return (
    <Box
      className="sheet-paper-only"
      style={{
        paddingLeft: mm(INSET),
        paddingRight: mm(INSET),
        paddingBottom: mm(1),
        borderBottomWidth: mm(0.25),
        borderColor: PAPER_COLOURS.ink,
      }}
    >
      <Box style={{ height: mm(RECORD.heading - 1), justifyContent: "center" }}>
        <Text as="h2" style={{ ...TYPE.body, ...BOLD }}>
          Measured on the floor
        </Text>
      </Box>
      <Box
        style={{
          flexDirection: "row",
          height: mm(RECORD.head),
          borderBottomWidth: mm(0.25),
          borderColor: PAPER_COLOURS.ink,
        }}
      >
        {COLUMNS.map(([head, share], index) => (
          <Box
            key={head}
            style={{
              flexGrow: share,
              flexShrink: 1,
              flexBasis: 0,
              paddingLeft: mm(1),
              borderLeftWidth: index === 0 ? 0 : mm(0.2),
              borderColor: PAPER_COLOURS.cell,
            }}
          >
            <Text style={TYPE.value}>{head}</Text>
          </Box>
        ))}
      </Box>
      {Array.from({ length: rows }, (_, row) => (
        <Box
          key={row}
          style={{
            flexDirection: "row",
            height: mm(RECORD.row),
            borderBottomWidth: mm(0.2),
            borderColor: PAPER_COLOURS.cell,
          }}
        >
          {COLUMNS.map(([head, share], index) => (
            <Box
              key={head}
              style={{
                flexGrow: share,
                flexShrink: 1,
                flexBasis: 0,
                borderLeftWidth: index === 0 ? 0 : mm(0.2),
                borderColor: PAPER_COLOURS.cell,
              }}
            />
          ))}
        </Box>
      ))}
    </Box>
  );
}

import { CautionSign } from "#app/components/method/CautionSign.tsx";
import { CAUTIONS_BLOCK, INSET } from "#app/lib/sheet/paper-geometry.ts";
import { bondWords, cautionColumn, cautionRows, WRITE_LINE } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetHands } from "#app/schemas/sheet-document.ts";
import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit } from "./kit.ts";
import { WriteIn } from "./WriteIn.tsx";

interface Props {
  kit: Kit;
  hands: SheetHands;
  frame: number;
}

/** What hands need beside the steps: room for carrier and tape as used, the cautions, and what to do when a wafer breaks. */
export function HandsFoot({ kit, hands, frame }: Props) {
  const { Box, Text, Run } = kit;
  const { bonds, tapes, emergency } = hands;
  return (
    <>
      {bonds.length + tapes.length > 0 ? (
        <Box
          role="region"
          label="Carrier and tape"
          style={{
            paddingLeft: mm(INSET),
            paddingRight: mm(INSET),
            paddingTop: mm(0.4),
            paddingBottom: mm(1.2),
            borderBottomWidth: mm(0.25),
            borderColor: PAPER_COLOURS.ink,
          }}
        >
          {bonds.map((bond) => (
            <Box key={bond.steps} className="sheet-stack" style={LINE}>
              <Box style={{ flexShrink: 1 }}>
                <Text style={TYPE.body}>
                  <Run style={BOLD}>{bond.carrier}</Run>
                  {bondWords(bond).slice(bond.carrier.length)}
                </Text>
              </Box>
              <WriteIn kit={kit} label="Carrier number" width={30} />
            </Box>
          ))}
          {tapes.map((tape) => (
            <Box key={tape} className="sheet-stack" style={LINE}>
              <WriteIn kit={kit} label={tape} strong width={38} />
              <WriteIn kit={kit} label="on since" width={30} />
              <WriteIn kit={kit} label="days at most" width={14} />
            </Box>
          ))}
        </Box>
      ) : null}
      <Cautions kit={kit} hands={hands} frame={frame} />
      <Box
        style={{
          paddingLeft: mm(INSET),
          paddingRight: mm(INSET),
          paddingTop: mm(0.6),
          paddingBottom: mm(0.8),
          borderTopWidth: mm(0.25),
          borderColor: PAPER_COLOURS.ink,
        }}
      >
        <Text as="h2" style={TYPE.body}>
          <Run style={BOLD}>{emergency.heading}</Run>
          {` ${emergency.text}`}
          {emergency.call === null ? null : <Run style={BOLD}>{` Call: ${emergency.call}`}</Run>}
        </Text>
        {emergency.call === null ? (
          <Box className="sheet-stack" style={LINE}>
            <WriteIn kit={kit} label="Call the shift lead" width={42} />
            <WriteIn kit={kit} label="process owner" width={42} />
          </Box>
        ) : null}
      </Box>
    </>
  );
}

const LINE = {
  flexDirection: "row",
  justifyContent: "space-between",
  alignItems: "flex-end",
  columnGap: mm(4),
  minHeight: mm(WRITE_LINE),
} as const;

/** In three columns, with their pictograms; the first says what an estimate is and takes two. */
function Cautions({ kit, hands, frame }: Props) {
  const { Box, Text, Drawing } = kit;
  const { sign, gap, rowGap } = CAUTIONS_BLOCK;
  const column = cautionColumn(frame);
  return (
    <Box
      role="list"
      label="Cautions"
      style={{ paddingLeft: mm(INSET), paddingRight: mm(INSET), paddingTop: mm(0.8), paddingBottom: mm(0.2) }}
    >
      {cautionRows(hands.cautions).map((row, index) => (
        <Box key={index} className="sheet-stack" style={{ flexDirection: "row", paddingBottom: mm(rowGap) }}>
          {row.map((caution, at) => (
            <Box
              key={caution.sign}
              role="listitem"
              style={{
                flexDirection: "row",
                columnGap: mm(gap),
                width: mm(index === 0 && at === 0 ? 2 * column : column),
                paddingRight: mm(2),
              }}
            >
              <Drawing width={sign} height={sign}>
                <CautionSign sign={caution.sign} />
              </Drawing>
              <Box style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0 }}>
                <Text style={TYPE.body}>{caution.text}</Text>
              </Box>
            </Box>
          ))}
        </Box>
      ))}
    </Box>
  );
}

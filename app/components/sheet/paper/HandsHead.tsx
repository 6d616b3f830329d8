import { lineBarLayout } from "#app/components/drawings/line-bar-layout.ts";
import { OUTCOME_SIGNS } from "#app/components/drawings/severity.ts";
import { SupportBar } from "#app/components/drawings/SupportBar.tsx";
import { INSET } from "#app/lib/sheet/paper-geometry.ts";
import type { SheetDocument, SheetHands } from "#app/schemas/sheet-document.ts";
import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit } from "./kit.ts";
import { Sign } from "./signs.tsx";
import { WriteIn } from "./WriteIn.tsx";

/** What this paper is and for which wafers; on every page for hands. */
export function HandsIdentity({ kit, document }: { kit: Kit; document: SheetDocument }) {
  const { Box, Text, Run } = kit;
  const { hands, name } = document;
  return (
    <Box
      className="sheet-stack"
      style={{
        flexDirection: "row",
        justifyContent: "space-between",
        columnGap: mm(4),
        paddingTop: mm(1.6),
        paddingLeft: mm(INSET),
        paddingRight: mm(INSET),
      }}
    >
      <Box style={{ flexShrink: 1 }}>
        {hands.notices.map((notice) => (
          <Text key={notice} style={{ ...TYPE.body, ...BOLD }}>
            {notice}
          </Text>
        ))}
        <Text style={TYPE.body}>
          <Run style={BOLD}>{name}</Run>
          {`, program ${hands.program}`}
        </Text>
        {hands.effective === null ? null : <Text style={TYPE.body}>{hands.effective}</Text>}
      </Box>
      <Box style={{ alignItems: "flex-end" }}>
        {hands.lots === null ? (
          <WriteIn kit={kit} label="Lot" width={38} />
        ) : (
          <Text style={{ ...TYPE.body, ...BOLD }}>{hands.lots}</Text>
        )}
        <WriteIn kit={kit} label="Wafers" width={38} />
      </Box>
    </Box>
  );
}

/** The answer in one sentence, and the support over all steps. */
export function HandsAnswer({ kit, hands, frame }: { kit: Kit; hands: SheetHands; frame: number }) {
  const { Box, Text, Run, Drawing } = kit;
  const { outcome, where, answer, blocked, support } = hands;
  const sign = OUTCOME_SIGNS[outcome];
  const { height, sizes } = lineBarLayout({ ...support, variant: "paper" });
  return (
    <>
      <Box
        style={{
          paddingLeft: mm(INSET),
          paddingRight: mm(INSET),
          paddingTop: mm(0.8),
          paddingBottom: mm(2.4),
          borderBottomWidth: mm(0.25),
          borderColor: PAPER_COLOURS.ink,
        }}
      >
        {blocked ? (
          <Box
            style={{
              flexDirection: "row",
              alignItems: "center",
              columnGap: mm(1.6),
              paddingTop: mm(0.8),
              paddingBottom: mm(0.5),
            }}
          >
            <Sign kit={kit} level={sign.level} />
            <Text style={TYPE.group}>
              <Run style={BOLD}>{sign.word}</Run>
              {where === null ? "" : ` ${where}`}
            </Text>
          </Box>
        ) : null}
        <Text as="h1" style={{ ...TYPE.answer, ...BOLD }}>
          {answer}
        </Text>
      </Box>
      <Box style={{ borderBottomWidth: mm(0.25), borderColor: PAPER_COLOURS.ink }}>
        <Drawing width={frame} height={(height / sizes.width) * frame} className="sheet-wide">
          <SupportBar {...support} variant="paper" />
        </Drawing>
      </Box>
    </>
  );
}

/** What this revision allows beside itself, for whom and until when. */
export function HandsDeviations({ kit, deviations }: { kit: Kit; deviations: readonly string[] }) {
  const { Box, Text } = kit;
  if (deviations.length === 0) return null;
  return (
    <Box
      style={{
        paddingLeft: mm(INSET),
        paddingRight: mm(INSET),
        paddingTop: mm(0.7),
        paddingBottom: mm(0.8),
        borderBottomWidth: mm(0.25),
        borderColor: PAPER_COLOURS.ink,
      }}
    >
      <Text as="h2" style={{ ...TYPE.body, ...BOLD }}>
        {deviations.length === 1 ? "Deviation in force" : "Deviations in force"}
      </Text>
      {deviations.map((deviation) => (
        <Text key={deviation} style={TYPE.body}>
          {deviation}
        </Text>
      ))}
    </Box>
  );
}

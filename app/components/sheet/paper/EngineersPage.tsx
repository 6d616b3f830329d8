import type { Paper } from "#app/lib/paper-size.ts";
import { INSET } from "#app/lib/sheet/paper-geometry.ts";
import type { SheetPage } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetDocument, SheetEngineers } from "#app/schemas/sheet-document.ts";
import { Basis } from "./Basis.tsx";
import { BOLD, mm, TYPE, type Kit } from "./kit.ts";
import { StepTable } from "./StepTable.tsx";

interface Props {
  kit: Kit;
  document: SheetDocument;
  engineers: SheetEngineers;
  paper: Paper;
  page: SheetPage & { kind: "engineers" };
}

/** A page for engineers: figures step by step, and what they rest on. */
export function EngineersPage({ kit, document, engineers, paper, page }: Props) {
  const { Box, Text, Run } = kit;
  return (
    <>
      <Box
        className="sheet-stack"
        style={{
          flexDirection: "row",
          justifyContent: "space-between",
          height: mm(8),
          paddingTop: mm(1.6),
          paddingLeft: mm(INSET),
          paddingRight: mm(INSET),
        }}
      >
        <Text as="h2" style={TYPE.title}>
          <Run style={BOLD}>{document.name}</Run>
          {", for engineers"}
        </Text>
        <Text style={{ ...TYPE.title, ...BOLD }}>{document.hands.notices[0] ?? ""}</Text>
      </Box>
      {page.steps.length > 0 ? (
        <StepTable
          kit={kit}
          steps={page.steps}
          paper={paper}
          diameter={document.diameter}
          exaggeration={engineers.exaggeration}
        />
      ) : null}
      {page.basis ? <Basis kit={kit} engineers={engineers} paper={paper} alone={page.steps.length === 0} /> : null}
    </>
  );
}

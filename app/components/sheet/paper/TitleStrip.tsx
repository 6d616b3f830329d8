import { CodeDrawing } from "#app/components/drawings/CodeDrawing.tsx";
import { TITLE_STRIP } from "#app/lib/sheet/paper-geometry.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit } from "./kit.ts";

type Fields = SheetDocument["titleBlock"] & { page: string };
type Cell = readonly [label: string, field: keyof Fields, share: number, strong?: boolean];

/** The fields of ISO 7200 in four rows; shares of twelve. */
const ROWS: readonly (readonly Cell[])[] = [
  [
    ["Legal owner", "owner", 7.4],
    ["Document type", "documentType", 4.6],
  ],
  [["Title", "title", 12, true]],
  [
    ["Prepared by", "prepared", 4],
    ["Checked by", "checked", 4],
    ["Released by", "released", 4],
  ],
  [
    ["Number", "number", 2.9, true],
    ["Revision", "revision", 1.7, true],
    ["Status", "status", 3.4, true],
    ["Date of issue", "date", 2.4],
    ["Page", "page", 1.6],
  ],
];

interface Props {
  kit: Kit;
  document: SheetDocument;
  page: string;
  printedAt: string | undefined;
  height: number;
}

/** The foot of every page: the code that says whether the paper is still current, and the title block. */
export function TitleStrip({ kit, document, page, printedAt, height }: Props) {
  const { Box } = kit;
  return (
    <Box
      className="sheet-stack sheet-wide"
      style={{ flexDirection: "row", height: mm(height), borderTopWidth: mm(0.35), borderColor: PAPER_COLOURS.ink }}
    >
      <Currency kit={kit} document={document} page={page} printedAt={printedAt} />
      <Box
        role="region"
        label={`Title block, page ${page}`}
        style={{ width: mm(TITLE_STRIP.block), borderLeftWidth: mm(0.35) }}
      >
        {ROWS.map((row, at) => (
          <Box
            key={at}
            className="sheet-wide"
            style={{
              flexDirection: "row",
              height: mm(TITLE_STRIP.rows[at] ?? 8),
              borderTopWidth: at === 0 ? 0 : mm(0.2),
              borderColor: PAPER_COLOURS.cell,
            }}
          >
            {row.map((cell, place) => (
              <Field
                key={cell[1]}
                kit={kit}
                cell={cell}
                fields={{ ...document.titleBlock, page }}
                first={place === 0}
              />
            ))}
          </Box>
        ))}
      </Box>
    </Box>
  );
}

function Currency({ kit, document, page, printedAt }: Omit<Props, "height">) {
  const { Box, Text, Drawing } = kit;
  const { status, uncontrolled, hands } = document;
  return (
    <Box style={{ flexDirection: "row", flexGrow: 1, flexShrink: 1, flexBasis: 0, alignItems: "center" }}>
      {status ? (
        <Box style={{ paddingLeft: mm(1.5) }}>
          <Drawing width={TITLE_STRIP.code} height={TITLE_STRIP.code}>
            <CodeDrawing {...status.code} label={`Code that leads to ${status.address}`} />
          </Drawing>
        </Box>
      ) : null}
      <Box
        style={{
          flexGrow: 1,
          flexShrink: 1,
          flexBasis: 0,
          paddingLeft: mm(status ? 1.5 : 3),
          paddingRight: mm(2),
          rowGap: mm(0.6),
        }}
      >
        {status ? <Text style={{ ...TYPE.value, ...BOLD }}>{status.words}</Text> : null}
        {status ? null : <Text style={{ ...TYPE.value, ...BOLD }}>{hands.notices[0] ?? ""}</Text>}
        <Text style={TYPE.value}>{uncontrolled}</Text>
        <Text style={TYPE.value}>{`Page ${page}`}</Text>
        {printedAt === undefined ? null : (
          <Text style={TYPE.value}>{`Printed ${printedAt.slice(0, 16).replace("T", " ")} UTC`}</Text>
        )}
      </Box>
    </Box>
  );
}

function Field({ kit, cell, fields, first }: { kit: Kit; cell: Cell; fields: Fields; first: boolean }) {
  const { Box, Text } = kit;
  const [label, field, share, strong = false] = cell;
  return (
    <Box
      style={{
        flexGrow: share,
        flexShrink: 1,
        flexBasis: 0,
        paddingTop: mm(0.4),
        paddingLeft: mm(1.4),
        paddingRight: mm(1),
        borderLeftWidth: first ? 0 : mm(0.2),
        borderColor: PAPER_COLOURS.cell,
      }}
    >
      <Text style={{ ...TYPE.label, color: PAPER_COLOURS.quiet }}>{label}</Text>
      <Text style={{ ...(field === "title" ? TYPE.title : TYPE.value), ...(strong ? BOLD : {}) }}>{fields[field]}</Text>
    </Box>
  );
}

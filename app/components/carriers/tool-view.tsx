import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import type { RecordView } from "#app/components/library/LibraryDetail.tsx";
import type { ListView } from "#app/components/library/LibraryList.tsx";
import type { Fact } from "#app/components/library/Facts.tsx";
import { givenRows, notGiven, propertyRows } from "#app/components/library/property.ts";
import type { Measured } from "#app/engine/measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { formatBare, formatMeasured } from "#app/lib/format-measured.ts";
import { KINDS, kindPath } from "#app/lib/library-kinds.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { SecondLine } from "./SecondLine.tsx";
import { TOOL_HANDLING_PROPERTIES, TOOL_PROPERTIES } from "./tool-properties.ts";

type Tool = LibraryRecords["equipment"];

const micrometres = (value: number) => formatQuantity(value, "length", { unit: "µm" });
const bare = (limit: Measured | null, missing: string) =>
  limit ? formatMeasured(limit, "length", { unit: "µm", bare: true }) : missing;

export const TOOL_LIST: ListView<Tool> = {
  ...KINDS.tools,
  path: kindPath("tools"),
  filters: [
    {
      name: "hot",
      label: "When hot",
      options: [
        { value: "free", label: "Free" },
        { value: "held", label: "Held" },
      ],
    },
  ],
  belongs: "Classes of tool belong here, each with the warp that it takes. A step chooses one and is judged by it.",
  columns: [
    {
      key: "up",
      head: "Edges up",
      unit: "µm",
      numeric: true,
      sortable: true,
      cell: ({ warpLimitEdgesUp }) => bare(warpLimitEdgesUp, "no limit"),
    },
    {
      key: "down",
      head: "Edges down",
      unit: "µm",
      numeric: true,
      sortable: true,
      cell: ({ warpLimitEdgesDown }) => bare(warpLimitEdgesDown, "no limit"),
    },
    {
      key: "source",
      head: "Source of limits",
      wide: true,
      cell: ({ warpLimitEdgesUp, warpLimitEdgesDown }) => {
        const sources = [warpLimitEdgesUp, warpLimitEdgesDown].flatMap((limit) => limit?.source ?? []);
        const source = sources.find((each) => each === "assumed") ?? sources[0];
        return source && <SourceMark kind={source} />;
      },
    },
    {
      key: "least",
      head: "Unsupported from",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ leastUnsupportedThickness: least }) => (least?.value === 0 ? "any" : bare(least, "not given")),
    },
    {
      key: "hot",
      head: "When hot",
      sortable: true,
      wide: true,
      cell: ({ atPeak, holding }) => (
        <>
          {holding.startsWith(atPeak) ? holding : atPeak}
          {!holding.startsWith(atPeak) && <SecondLine>{holding}</SecondLine>}
        </>
      ),
    },
    {
      key: "diameter",
      head: "Largest diameter",
      unit: "mm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ largestDiameter }) => formatBare(largestDiameter.value, "length", "mm"),
    },
  ],
};

function takes({ warpLimitEdgesUp: up, warpLimitEdgesDown: down }: Tool): string {
  if (!up && !down) return "No warp limit: the wafer comes on a frame that keeps it flat.";
  const one = (limit: Measured | null, word: string) =>
    limit ? `${micrometres(limit.value)} ${word}` : `any warp ${word}`;
  return `Takes ${one(up, "edges up")} and ${one(down, "edges down")}, as loaded.`;
}

function whenHot({ atPeak }: Tool): string {
  return atPeak === "free"
    ? "The wafer is free when it is hot, so its warp at peak is judged as well."
    : "The wafer is held when it is hot, so its warp is judged as it is loaded and as it leaves.";
}

function unsupported({ leastUnsupportedThickness: least }: Tool): string {
  if (!least) return "";
  return least.value === 0
    ? " It takes silicon of any thickness without support."
    : ` Without support it takes silicon from ${micrometres(least.value)} up.`;
}

/** What the handling rules take it as, and what of it they would have to do without. */
function handlingFacts({ handling }: Tool): Fact[] {
  const { clamping, seal, contactFace, contactMeans, sensesOptically, ioniser } = handling;
  const yesOrNo = (answer: boolean) => (answer ? "yes" : "no");
  const missing = notGiven(handling, TOOL_HANDLING_PROPERTIES);
  return [
    { label: "Clamps by", value: clamping ?? "not given" },
    ...(seal ? [{ label: "Vacuum seal", value: seal }] : []),
    ...(contactFace && contactMeans
      ? [{ label: "Touches", value: `${contactFace === "front" ? "device side" : "back side"}, ${contactMeans}` }]
      : []),
    ...(sensesOptically === null ? [] : [{ label: "Finds it by light", value: yesOrNo(sensesOptically) }]),
    ...(ioniser === null ? [] : [{ label: "Ioniser", value: yesOrNo(ioniser) }]),
    ...(missing.length > 0 ? [{ label: "Not given", value: missing.join(", ") }] : []),
  ];
}

/** A tool: the warp that it takes, and what is judged while the wafer is hot. */
export function toolView(tool: Tool): RecordView {
  return {
    answer: takes(tool),
    because: whenHot(tool) + unsupported(tool),
    properties: [...propertyRows(tool, TOOL_PROPERTIES), ...givenRows(tool.handling, TOOL_HANDLING_PROPERTIES)],
    facts: [
      { label: "Holds by", value: tool.holding },
      { label: "When hot", value: tool.atPeak },
      ...handlingFacts(tool),
    ],
  };
}

import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import type { RecordView } from "#app/components/library/LibraryDetail.tsx";
import type { ListView } from "#app/components/library/LibraryList.tsx";
import { propertyRows } from "#app/components/library/property.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { formatBare } from "#app/lib/format-measured.ts";
import { TAPE_KINDS } from "#app/lib/tape-kinds.ts";
import { KINDS, kindPath } from "#app/lib/library-kinds.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { RESISTANCES, resistanceText } from "./resistance-words.ts";
import { SecondLine } from "./SecondLine.tsx";
import { TAPE_PROPERTIES } from "./tape-properties.ts";

type Tape = LibraryRecords["tape"];

const NONE = "–";

const inLight = ({ handling: { releasesInLight } }: Tape) =>
  releasesInLight === null ? "not given" : releasesInLight ? "by ultraviolet light" : "not by light";

/** What it is known to stand: 'vacuum, plasma'. */
const standing = ({ handling }: Tape) =>
  RESISTANCES.filter(({ name }) => handling[name]?.word === "resists")
    .map(({ label }) => label.toLowerCase())
    .join(", ") || "nothing given";

export const TAPE_LIST: ListView<Tape> = {
  ...KINDS.tapes,
  path: kindPath("tapes"),
  filters: [{ name: "kind", label: "For", options: sameWords(TAPE_KINDS) }],
  belongs:
    "Grinding and dicing tapes belong here, each with its limit, what it stands and how it lets go. A step that laminates or mounts chooses one.",
  columns: [
    { key: "kind", head: "For", sortable: true, wide: true, cell: ({ kind }) => kind },
    {
      key: "limit",
      head: "Limit",
      unit: "°C",
      numeric: true,
      sortable: true,
      cell: ({ temperatureLimit }) =>
        temperatureLimit ? formatBare(temperatureLimit.value, "temperature", "°C") : NONE,
    },
    {
      key: "source",
      head: "Source of limit",
      wide: true,
      cell: ({ temperatureLimit }) => temperatureLimit && <SourceMark kind={temperatureLimit.source} />,
    },
    {
      key: "embedding",
      head: "Soft layer",
      unit: "µm",
      numeric: true,
      sortable: true,
      cell: ({ embeddingDepth }) => (embeddingDepth ? formatBare(embeddingDepth.value, "length", "µm") : NONE),
    },
    {
      key: "thickness",
      head: "Thickness",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ thickness }) => (thickness ? formatBare(thickness.value, "length", "µm") : NONE),
    },
    {
      key: "time",
      head: "Longest time",
      unit: "d",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ longestTime }) => (longestTime ? formatBare(longestTime.value, "time", "d") : NONE),
    },
    {
      key: "stands",
      head: "Stands",
      wide: true,
      cell: (tape) => (
        <>
          {standing(tape)}
          {tape.handling.releasesInLight && <SecondLine>lets go {inLight(tape)}</SecondLine>}
        </>
      ),
    },
  ],
};

function meaning({ kind, temperatureLimit, handling }: Tape): string {
  const heat = temperatureLimit
    ? `to ${formatQuantity(temperatureLimit.value, "temperature", { unit: "°C" })}`
    : "to the site’s limit for tape";
  const vacuum = handling.vacuum?.word === "resists" ? "It goes into vacuum." : "It does not go into vacuum.";
  return `${kind === "grinding tape" ? "Grinding tape" : "Dicing tape"}, ${heat}. ${vacuum}`;
}

/** A tape: up to where it may be heated and whether it goes into vacuum, and all that is known of it. */
export function tapeView(tape: Tape): RecordView {
  const { handling, handlingSource } = tape;
  return {
    answer: meaning(tape),
    because: "What a step states of its tape itself counts before what stands here.",
    properties: propertyRows(tape, TAPE_PROPERTIES),
    facts: [
      { label: "For", value: tape.kind },
      { label: "Lets go", value: inLight(tape) },
      ...RESISTANCES.map(({ name, label }) => ({ label, value: resistanceText(handling[name]) })),
      ...(handling.attackedBy.length > 0 ? [{ label: "Attacked by", value: handling.attackedBy.join(", ") }] : []),
      { label: "Source of these", value: <SourceMark kind={handlingSource} /> },
    ],
  };
}

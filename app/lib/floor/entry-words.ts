import { formatQuantity } from "#app/engine/units/format.ts";
import type { FloorContent } from "#app/schemas/floor-entry.ts";

/** A reading with its unit and, where it was given, its expanded uncertainty: 'bow −41 µm', 'warp 43 ± 5 µm'. */
export function readingWords({ what, value, uncertainty }: Extract<FloorContent, { kind: "measured" }>): string {
  const bare = formatQuantity(value, "length", { unit: "µm", decimals: 0, sign: what === "bow" });
  if (uncertainty === null) return `${what} ${bare}`;
  return `${what} ${bare.replace("\u00A0µm", "")} ± ${formatQuantity(uncertainty, "length", { unit: "µm", decimals: 0 })}`;
}

const wafers = (count: number | null) => (count === null ? "" : `, ${count === 1 ? "1 wafer" : `${count} wafers`}`);

/** What an entry says, in a line. */
export function entryWords(content: FloorContent): string {
  switch (content.kind) {
    case "acknowledged":
      return "sheet acknowledged";
    case "started":
      return "started";
    case "done":
      return `done${wafers(content.count)}`;
    case "observed":
      return `“${content.text}”${wafers(content.count)}`;
    case "measured": {
      const { wafer, on, sideUp, gravity, remark } = content;
      const how = `on ${on}, ${sideUp} up, own weight ${gravity}`;
      return `${wafer === "" ? "" : `${wafer}: `}${readingWords(content)}, ${how}${remark === "" ? "" : `. “${remark}”`}`;
    }
  }
}

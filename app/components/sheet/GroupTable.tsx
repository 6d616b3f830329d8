import type { ReactNode } from "react";
import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { SupportTag } from "#app/components/drawings/SupportTag.tsx";
import { GROUP_COLUMNS, waferLines } from "#app/lib/sheet-pages.ts";
import type { SheetGroupView } from "#app/lib/sheet-view.ts";

const HEADS: readonly [head: string, width: number][] = [
  ["The wafer", GROUP_COLUMNS.wafer],
  ["Stop at", GROUP_COLUMNS.stop],
  ["Do not", GROUP_COLUMNS.doNot],
  ["Initials", GROUP_COLUMNS.initials],
];

interface Props {
  groups: readonly SheetGroupView[];
  /** wafer diameter, m */
  diameter: number;
  exaggeration: number;
}

/** Steps grouped by what holds the wafer: what it is like there, the reading that means stop, and what not to do. */
export function GroupTable({ groups, diameter, exaggeration }: Props) {
  return (
    <table className="w-full table-fixed border-collapse text-left max-tablet:block max-tablet:[&_:is(tbody,tr,th,td)]:block">
      <caption className="sr-only">Steps grouped by what holds the wafer</caption>
      <colgroup>
        {HEADS.map(([head, width]) => (
          <col key={head} style={{ width: `${width}%` }} />
        ))}
      </colgroup>
      <thead className="max-tablet:hidden print:table-header-group">
        <tr className="border-b-[0.35mm] border-ink text-[9pt]/[11pt]">
          {HEADS.map(([head], index) => (
            <th
              key={head}
              scope="col"
              className={`py-[0.6mm] font-normal ${index > 0 ? "border-l-[0.2mm] border-line" : ""} ${index < 3 ? "px-[1.5mm]" : "px-[0.4mm]"}`}
            >
              {head}
            </th>
          ))}
        </tr>
      </thead>
      {groups.map((group) => (
        <tbody key={group.steps} className="keep-whole border-b-[0.35mm] border-ink">
          <tr>
            <th scope="rowgroup" colSpan={3} className="px-[1.5mm] pt-[1.2mm] font-normal">
              <GroupHead group={group} diameter={diameter} exaggeration={exaggeration} />
            </th>
            <td rowSpan={2} className="border-l-[0.2mm] border-line max-tablet:hidden!" />
          </tr>
          <tr className="align-top">
            <td className="px-[1.5mm] pt-[0.6mm] pb-[1.2mm]">
              <Lines>{waferLines(group)}</Lines>
            </td>
            <td className="px-[1.5mm] pt-[0.6mm] pb-[1.2mm]">
              <strong>
                <Lines>{group.stop.lines}</Lines>
              </strong>
              <Lines>{[group.stop.how]}</Lines>
            </td>
            <td className="px-[1.5mm] pt-[0.6mm] pb-[1.2mm]">
              {group.doNot.length === 0 ? "Nothing beyond the site’s rules" : <DoNotList lines={group.doNot} />}
            </td>
          </tr>
        </tbody>
      ))}
    </table>
  );
}

function GroupHead({ group, diameter, exaggeration }: Omit<Props, "groups"> & { group: SheetGroupView }) {
  const { steps, support, heldBy, sideUp, bow } = group;
  return (
    <span className="flex flex-wrap items-center gap-x-[4mm]">
      <strong className="text-[14pt]/[17pt] whitespace-nowrap">
        {/^\d+$/.test(steps) ? "Step" : "Steps"} {steps}
      </strong>
      <SupportTag support={support} />
      {heldBy === null ? null : <span>{heldBy}</span>}
      <strong>{sideUp}</strong>
      <span className="ml-auto max-tablet:ml-0">
        <BowLine
          label=""
          width={92}
          height={23}
          diameter={diameter}
          {...bow}
          exaggeration={exaggeration}
          showScale={bow.shape.kind !== "held"}
        />
      </span>
    </span>
  );
}

function Lines({ children }: { children: readonly string[] }): ReactNode {
  return children.map((line) => (
    <span key={line} className="block">
      {noBreak(line)}
    </span>
  ));
}

function DoNotList({ lines }: { lines: readonly string[] }) {
  return (
    <ul>
      {lines.map((line) => (
        <li
          key={line}
          className="relative pl-[3mm] before:absolute before:top-[2.3mm] before:left-0 before:w-[2mm] before:border-t-[0.3mm] before:border-ink before:content-['']"
        >
          {noBreak(line)}
        </li>
      ))}
    </ul>
  );
}

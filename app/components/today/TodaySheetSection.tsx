import type { ReactNode } from "react";
import type { TodayGroup, TodaySheet } from "#app/schemas/today.ts";
import { TodayRow } from "./TodayRow.tsx";
import { TodaySection } from "./TodaySection.tsx";

interface Props {
  title: string;
  remark: string;
  group: TodayGroup<TodaySheet>;
  /** where all of them are */
  more: string;
  state: (sheet: TodaySheet) => ReactNode;
  action: (sheet: TodaySheet) => { words: string; to: string };
}

/** Sheets that have something in common, nothing where there are none. */
export function TodaySheetSection({ title, remark, group, more, state, action }: Props) {
  if (group.total === 0) return null;
  return (
    <TodaySection title={title} remark={remark} more={{ count: group.total - group.rows.length, to: more }}>
      <ul>
        {group.rows.map((sheet) => (
          <TodayRow
            key={sheet.id}
            title={`${sheet.name}, ${sheet.title}`}
            state={<span className="text-quiet">{state(sheet)}</span>}
            action={action(sheet)}
          >
            {sheet.words !== "" && <span className="wrap-anywhere">{sheet.words} </span>}
            <span className="text-quiet">{sheet.program}</span>
          </TodayRow>
        ))}
      </ul>
    </TodaySection>
  );
}

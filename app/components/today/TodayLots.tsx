import type { TodayGroup, TodayLot, TodayLots } from "#app/schemas/today.ts";
import { TodayRow } from "./TodayRow.tsx";
import { TodaySection } from "./TodaySection.tsx";

/** Lots and steps that stand still, and lots whose paper is not in force any more. */
export function LotsThatWait({ lots }: { lots: TodayLots }) {
  return (
    <>
      <Lots title="Held and stopped" remark="longest first" group={lots.blocked} act="Clear it" />
      <Lots
        title="Handed over"
        remark="the last shift answers for it until it is taken"
        group={lots.toTake}
        act="Take it over"
        all="/floor/hand-overs"
      />
      <Lots title="On old sheets" remark="nothing is started by them" group={lots.toMove} act="Move it" />
    </>
  );
}

interface Props {
  title: string;
  remark: string;
  group: TodayGroup<TodayLot>;
  /** what somebody does who may */
  act: string;
  /** where all of them are */
  all?: string;
}

function Lots({ title, remark, group, act, all = "/lots" }: Props) {
  if (group.total === 0) return null;
  return (
    <TodaySection title={title} remark={remark} more={{ count: group.total - group.rows.length, to: all }}>
      <ul>
        {group.rows.map(({ id, path, title: what, words, program, at, mine }) => (
          <TodayRow
            key={id}
            title={what}
            state={<span className="text-quiet">since {at.slice(0, 10)}</span>}
            action={{ words: mine ? act : "See the lot", to: path }}
          >
            <span className="wrap-anywhere">{words} </span>
            <span className="text-quiet">{program}</span>
          </TodayRow>
        ))}
      </ul>
    </TodaySection>
  );
}

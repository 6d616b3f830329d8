import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { lyingAs } from "#app/lib/lying-as.ts";
import type { TodayAssessed } from "#app/schemas/today.ts";
import { TodayRow } from "./TodayRow.tsx";

interface Props {
  row: TodayAssessed;
  action: { words: string; to: string };
  /** one for the whole page */
  exaggeration: number;
  /** what it rests on has changed since, so the outcome is of then */
  stale?: boolean;
}

/** A flow with its newest assessment, the wafer drawn as it lies at the step that decides. */
export function TodayAssessedRow({ row, action, exaggeration, stale = false }: Props) {
  const { name, program, newest, sentence, wafer, diameter } = row;
  return (
    <TodayRow
      title={`${name}, assessment ${revisionLetters(newest.number)}`}
      action={action}
      state={
        <>
          <FindingTag outcome={newest.outcome} />
          {stale && <span className="block text-label text-quiet">before the change</span>}
        </>
      }
      drawing={
        wafer && (
          <BowLine
            diameter={diameter}
            shape={lyingAs(wafer.shape)}
            deviceSideUp={wafer.faceUp === "device side"}
            holding={wafer.holding}
            exaggeration={exaggeration}
            width={84}
            height={36}
            label=""
          />
        )
      }
    >
      {noBreak(sentence)}{" "}
      <span className="whitespace-nowrap text-quiet">{`${program}, ${newest.at.slice(0, 10)}`}</span>
    </TodayRow>
  );
}

import type { SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { HandOverLot, HandOverView } from "#app/schemas/hand-over.ts";
import { FloorClocks } from "./FloorClocks.tsx";
import { FloorHead } from "./FloorHead.tsx";
import { KeptLine } from "./KeptLine.tsx";
import { stateOf } from "./HandOverList.tsx";

interface Props {
  handOver: HandOverView;
  person: { id: string; name: string };
  /** ISO, for the clocks */
  now: string;
  /** the one before it, of the same place and another program, was taken just now */
  isNext: boolean;
  lastResult: SubmissionResult<string[]> | null | undefined;
}

/** What was left at a place, lot by lot, and its taking over. */
export function HandOverPage({ handOver, person, now, isNext, lastResult }: Props) {
  const { place, program, by, at, remark, content, moved, mayTake, takenRemark, taken } = handOver;
  return (
    <>
      <FloorHead person={person.name} personId={person.id} />
      <main id="main" className="mx-auto max-w-240 px-4 py-6 tablet:px-6">
        <KeptLine checkedAt={now} what="It is taken with a connection, or on paper." />
        {isNext && mayTake && (
          <p role="status" className="mb-3 border-l-4 border-clear bg-raised p-3 text-lead">
            That is taken. At the same place lots of {program} wait for you too.
          </p>
        )}
        <h1 className="text-answer font-medium wrap-anywhere">{place}</h1>
        <p className="text-lead text-quiet">
          {program}. Given by {by}, {minuteOf(at)}.
        </p>
        <p className={`mt-2 text-lead font-semibold ${taken ? "text-clear" : ""}`}>{stateOf(handOver)}</p>
        {takenRemark !== "" && <p className="text-lead whitespace-pre-line">“{takenRemark}”</p>}
        {remark !== "" && <p className="mt-3 text-lead whitespace-pre-line">{remark}</p>}
        {moved.length > 0 && (
          <p role="status" className="mt-3 border-l-4 border-caution pl-3 text-lead">
            Since it was given something has changed of {moved.join(", ")}. Open {moved.length === 1 ? "it" : "them"}{" "}
            before you take the place over.
          </p>
        )}
        <ul className="mt-4 border-t border-ink">
          {content.map((lot) => (
            <LeftLot key={lot.id} lot={lot} now={now} moved={moved.includes(lot.name)} />
          ))}
        </ul>
        {!taken && <p className="mt-10 hidden text-lead print:block">Taken over by, day and time in UTC:</p>}
        {mayTake && (
          <div className="fresh-only">
            <TakeOver lastResult={lastResult} />
          </div>
        )}
        <p className="mt-5 print:hidden">
          <a href="/floor/hand-overs" className="btn min-h-14 text-lead">
            All hand-overs
          </a>
        </p>
      </main>
    </>
  );
}

function LeftLot({ lot, now, moved }: { lot: HandOverLot; now: string; moved: boolean }) {
  const { id, name, on, remark, sheet, wafers, at, clocks, blocks, odd } = lot;
  return (
    <li className="break-inside-avoid border-b border-line py-4 text-lead">
      <h2 className="text-figure font-semibold wrap-anywhere">
        <a href={`/floor/lots/${id}`} className="link inline-flex min-h-11 items-center">
          Lot {name}
        </a>
      </h2>
      <p>
        On <b className="wrap-anywhere">{on}</b>
        {wafers.total > 0 && `, ${wafers.inLine} of ${wafers.total} wafers in line`},{" "}
        {sheet === null ? "on no sheet" : `sheet ${sheet}`}.
      </p>
      {at.map((each) => (
        <p key={each} className="first-letter:uppercase">
          {each}
          {moved ? " when it was given" : ""}.
        </p>
      ))}
      {remark !== "" && <p>“{remark}”</p>}
      {blocks.map((each) => (
        <p key={each} className="mt-1 border-l-4 border-stop pl-3 font-semibold">
          {each}
        </p>
      ))}
      {odd.map((each) => (
        <p key={each} className="mt-1 border-l-4 border-caution pl-3">
          {each}
        </p>
      ))}
      <FloorClocks clocks={clocks} now={now} />
    </li>
  );
}

function TakeOver({ lastResult }: Pick<Props, "lastResult">) {
  const [form, fields] = useRecordForm<{ remark: string }>({ id: "take-over", lastResult });
  return (
    <Form method="post" discover="none" id={form.id} noValidate className="floor-form mt-5 space-y-2 print:hidden">
      <FormHead lastResult={lastResult} stands="The place is not taken yet" />
      <p className="text-lead">
        Look at each lot before. You answer for the place from then on; your name and the time are kept beside theirs.
      </p>
      <NoteField field={fields.remark} label="What you found otherwise" rows={2} hint="May stay empty." />
      <SubmitButton busy="Taking over" className="min-h-27 w-full text-figure">
        I take it over
      </SubmitButton>
    </Form>
  );
}

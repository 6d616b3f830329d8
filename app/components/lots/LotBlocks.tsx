import { getFormProps } from "@conform-to/react";
import { Form } from "react-router";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { BLOCK_CAUSE_NAMES } from "#app/lib/floor/block-causes.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { FloorBlock, LotDesk } from "#app/schemas/floor-view.ts";
import { answerTo, type LotAnswer } from "./lot-answer.ts";

interface Props {
  desk: LotDesk;
  answer: LotAnswer;
  holdId: string;
}

/** What holds a lot and which of its steps are stopped, each with the way to clear it for who may, and the way to hold the lot. */
export function LotBlocks({ desk: { blocks, mayHold }, answer, holdId }: Props) {
  const shown = blocks.filter(({ kind }) => kind !== "revision");
  return (
    <>
      {shown.length === 0 ? (
        <p>Nothing holds the lot, and no step of its sheet is stopped.</p>
      ) : (
        <ul>
          {shown.map((block) => (
            <li
              key={`${block.kind} ${block.id} ${block.step}`}
              className="border-t border-line py-2 first:border-t-0 first:pt-0"
            >
              <p className="font-semibold text-stop">{block.what}</p>
              {block.opened && (
                <p>
                  “{block.opened.reason}”{" "}
                  <span className="text-quiet">
                    {block.opened.by}, {minuteOf(block.opened.at)}
                  </span>
                </p>
              )}
              <p className="text-quiet">{block.remedy}</p>
              <ClearForm block={block} answer={answer} />
            </li>
          ))}
        </ul>
      )}
      {mayHold && <HoldForm key={holdId} id={holdId} answer={answer} />}
    </>
  );
}

function ClearForm({ block: { id, kind, mayClear }, answer }: { block: FloorBlock; answer: LotAnswer }) {
  const lastResult = answerTo(answer, "clear", id ?? undefined);
  const [form, { words }] = useRecordForm<{ words: string }>({ id: `clear-${id ?? ""}`, lastResult });
  if (id === null || !mayClear) return null;
  return (
    <details className="mt-1 print:hidden" open={lastResult !== null}>
      <summary className="link w-fit cursor-pointer">Clear this {kind}</summary>
      <Form method="post" preventScrollReset {...getFormProps(form)} className="mt-2 max-w-160 space-y-2">
        <NoteField field={words} label="What was done about it" rows={2} />
        <input type="hidden" name="block" value={id} />
        <input type="hidden" name="kind" value={kind} />
        <button type="submit" name="intent" value="clear" className="btn">
          Clear it
        </button>
      </Form>
    </details>
  );
}

function HoldForm({ id, answer }: { id: string; answer: LotAnswer }) {
  const lastResult = answerTo(answer, "hold");
  const [form, { cause, reason }] = useRecordForm<{ cause: string; reason: string }>({ id: "hold", lastResult });
  return (
    <details className="mt-2 print:hidden" open={lastResult !== null}>
      <summary className="link w-fit cursor-pointer">Hold this lot</summary>
      <Form method="post" preventScrollReset {...getFormProps(form)} className="mt-2 max-w-160 space-y-2">
        <p>Nothing of it begins until the hold is cleared. Everybody who works in the program is told.</p>
        <ChoiceField
          field={cause}
          label="Cause"
          choices={sameWords(BLOCK_CAUSE_NAMES)}
          blank="Choose the cause"
          hint="It says who may clear it."
        />
        <NoteField field={reason} label="What happened" rows={2} />
        <input type="hidden" name="id" value={id} />
        <button type="submit" name="intent" value="hold" className="btn btn-remove">
          Hold the lot
        </button>
      </Form>
    </details>
  );
}

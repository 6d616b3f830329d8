import { useId } from "react";
import { Form } from "react-router";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import { WAFER_STATUSES } from "#app/lib/wafer-status.ts";
import type { LotWafer } from "#app/schemas/lot-view.ts";
import { answerTo, type LotAnswer } from "./lot-answer.ts";

interface Props {
  wafers: readonly LotWafer[];
  answer: LotAnswer;
}

/** Says where wafers of a lot stand, several at once. */
export function WaferStatus({ wafers, answer }: Props) {
  const id = useId();
  const fault = Object.values(answerTo(answer, "status")?.error ?? {}).flatMap((each) => each ?? [])[0];
  return (
    <details className="mt-3 print:hidden" open={fault !== undefined}>
      <summary className="link w-fit cursor-pointer">Say where wafers stand</summary>
      <Form method="post" preventScrollReset className="mt-2 max-w-160">
        <fieldset aria-describedby={`${id}-fault`}>
          <legend className="text-label text-quiet">Wafers</legend>
          <div className="flex flex-wrap gap-x-4">
            {wafers.map(({ id: wafer, name, slot }) => (
              <label key={wafer} className="flex min-h-8 items-center gap-2 pointer-coarse:min-h-11">
                <input type="checkbox" name="wafers" value={wafer} className="size-4 accent-ink" />
                {slot === null ? name : `${slot}: ${name}`}
              </label>
            ))}
          </div>
        </fieldset>
        <div className="field mt-2 max-w-64">
          <label htmlFor={id}>They are</label>
          <select id={id} name="status" defaultValue="broken" aria-describedby={`${id}-fault`}>
            {sameWords(WAFER_STATUSES).map(({ value, label }) => (
              <option key={value} value={value}>
                {label}
              </option>
            ))}
          </select>
          <small id={`${id}-fault`} className={fault ? "text-stop" : ""}>
            {fault}
          </small>
        </div>
        <button type="submit" name="intent" value="status" className="btn">
          Save where they stand
        </button>
      </Form>
    </details>
  );
}

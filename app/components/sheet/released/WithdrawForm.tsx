import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";

/** Withdraws the revision, with the reason. It cannot be taken back, so it is folded away until it is asked for. */
export function WithdrawForm({ answer }: { answer: SubmissionResult<string[]> | null | undefined }) {
  const [form, { reason }] = useRecordForm<{ reason: string }>({ id: "withdraw", lastResult: answer });
  const waiting = useNavigation().state === "submitting";
  return (
    <details open={answer !== null && answer !== undefined}>
      <summary className="link w-fit cursor-pointer">Withdraw this revision</summary>
      <Form method="post" {...getFormProps(form)} className="mt-3 max-w-160 space-y-2">
        <p>
          Everybody of the program is told, and the code on its papers says from now on that they must not be used. It
          cannot be taken back: a newer assessment has to be released.
        </p>
        <NoteField field={reason} label="Why it must not be used any more" />
        <button type="submit" name="intent" value="withdraw" className="btn btn-remove" disabled={waiting}>
          {waiting ? "Withdrawing" : "Withdraw it"}
        </button>
      </Form>
    </details>
  );
}

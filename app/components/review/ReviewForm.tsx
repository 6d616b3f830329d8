import { getFormProps, type FieldMetadata, type SubmissionResult } from "@conform-to/react";
import type { ReactNode } from "react";
import { Form, useNavigation } from "react-router";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { ReviewForm as Values } from "#app/schemas/review-form.ts";

/** What the action answers when a form was not taken. */
export type ReviewAnswer = { intent: string; lastResult: SubmissionResult<string[]> } | null | undefined;

/** Fields of the forms on the page of a review, by the name of each form. */
interface Fields {
  ask: { note: string };
  comment: { step: string; text: string };
  deviate: { findings: string[]; reason: string; scope: string; until: string };
  return: { reason: string };
  release: { assumptions: string; remark: string; proof: string; proofCode: string };
}

interface Props<Intent extends keyof Fields> {
  intent: Intent & Values["intent"];
  answer: ReviewAnswer;
  button: string;
  busy: string;
  primary?: boolean;
  children: (fields: { [Name in keyof Fields[Intent]]: FieldMetadata<Fields[Intent][Name]> }) => ReactNode;
}

/** One form of a review with its button; what was wrong with it stands at its own fields and in no other form. */
export function ReviewForm<Intent extends keyof Fields>({
  intent,
  answer,
  button,
  busy,
  primary = false,
  children,
}: Props<Intent>) {
  const [form, fields] = useRecordForm<Fields[Intent]>({
    id: `review-${intent}`,
    lastResult: answer?.intent === intent ? answer.lastResult : null,
  });
  const { state, formData } = useNavigation();
  const sending = state !== "idle" && formData?.get("intent") === intent;
  return (
    <Form method="post" {...getFormProps(form)} className="mt-3 max-w-160 space-y-2">
      {children(fields as Parameters<typeof children>[0])}
      <button
        type="submit"
        name="intent"
        value={intent}
        className={primary ? "btn btn-primary" : "btn"}
        disabled={state === "submitting"}
      >
        {sending ? busy : button}
      </button>
    </Form>
  );
}

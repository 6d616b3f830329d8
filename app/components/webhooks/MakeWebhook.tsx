import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { CheckList } from "#app/components/forms/CheckList.tsx";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import { eventWords, WEBHOOK_EVENT_NAMES, type WebhooksView } from "#app/schemas/webhook.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";

interface Props {
  programs: WebhooksView["programs"];
  lastResult: SubmissionResult<string[]> | undefined;
  proofAsked: ProofAsked;
  proofFault: ProofFault | undefined;
}

interface Values extends Record<string, unknown> {
  name: string;
  program: string;
  address: string;
  events: string[];
}

/** The form in which a person makes a webhook. */
export function MakeWebhook({ programs, lastResult, proofAsked, proofFault }: Props) {
  const [form, { name, program, address, events }] = useRecordForm<Values>({ id: "webhook", lastResult });
  return (
    <section aria-labelledby="make-webhook" className="frame p-4">
      <h2 id="make-webhook" className="font-semibold">
        Make a webhook
      </h2>
      <Form method="post" {...getFormProps(form)} className="mt-3 max-w-160 space-y-2">
        <LineField field={name} label="What receives it" hint="Such as: line board of bay 3." />
        <ChoiceField
          field={program}
          label="Program"
          choices={programs.map(({ id, name: label }) => ({ value: id, label }))}
          blank="Choose a program"
          hint="It hears of no other."
        />
        <LineField
          field={address}
          label="Address"
          hint="Put no password into it: every delivery is signed."
          input={{ inputMode: "url", autoCapitalize: "none", spellCheck: false, placeholder: "https://" }}
        />
        <CheckList
          field={events}
          legend="When it is told"
          options={WEBHOOK_EVENT_NAMES}
          words={eventWords}
          hint="It is told what your own role may read, and nothing more."
        />
        <ProofFields asked={proofAsked} fault={proofFault} label="Your password, to make it" />
        <SubmitButton busy="Making">Make the webhook</SubmitButton>
      </Form>
    </section>
  );
}

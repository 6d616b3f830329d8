import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { CheckList } from "#app/components/forms/CheckList.tsx";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { API_SCOPE_NAMES, API_SCOPES, TOKEN_LIVES, type TokensView } from "#app/schemas/api-token.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";

interface Props {
  programs: TokensView["programs"];
  lastResult: SubmissionResult<string[]> | undefined;
  proofAsked: ProofAsked;
  proofFault: ProofFault | undefined;
}

interface Values extends Record<string, unknown> {
  name: string;
  program: string;
  scopes: string[];
  days: string;
}

const LIVES = TOKEN_LIVES.map((days) => ({ value: String(days), label: `${days}\u00A0days` }));

/** The form in which a person makes a token. */
export function MakeToken({ programs, lastResult, proofAsked, proofFault }: Props) {
  const [form, { name, program, scopes, days }] = useRecordForm<Values>({
    id: "token",
    lastResult,
    defaultValue: { days: "90" },
  });
  return (
    <section aria-labelledby="make-token" className="frame p-4">
      <h2 id="make-token" className="font-semibold">
        Make a token
      </h2>
      <Form method="post" {...getFormProps(form)} className="mt-3 max-w-160 space-y-2">
        <input type="hidden" name="intent" value="make" />
        <LineField field={name} label="What will use it" hint="Such as: bow gauge in bay 3." />
        <ChoiceField
          field={program}
          label="Program"
          choices={programs.map(({ id, name: label }) => ({ value: id, label }))}
          blank="Choose a program"
          hint="It sees no other."
        />
        <CheckList
          field={scopes}
          legend="What it may do"
          options={API_SCOPE_NAMES}
          words={(scope) => API_SCOPES[scope]}
          hint="As little as it needs."
        />
        <ChoiceField field={days} label="Good for" choices={LIVES} hint="It can be revoked at any time." />
        <ProofFields asked={proofAsked} fault={proofFault} label="Your password, to make it" />
        <SubmitButton busy="Making">Make the token</SubmitButton>
      </Form>
    </section>
  );
}

import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { TOKEN_LIFETIME_WORDS } from "#app/lib/account-mail.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";
import { ProofFields } from "./ProofFields.tsx";

interface Props {
  email: string;
  proofAsked: ProofAsked;
  answer: AddressAnswer | undefined;
}

/** What the form answers: what was typed, and what is wrong at which field. */
export interface AddressAnswer {
  typed: string;
  fault?: string | undefined;
  proofFault?: ProofFault;
}

/** The form that asks for another e-mail address of one's own. */
export function AddressForm({ email, proofAsked, answer }: Props) {
  return (
    <Form method="post" className="max-w-160 space-y-2">
      <input type="hidden" name="intent" value="address" />
      <p className="wrap-anywhere text-quiet">
        {email} now. The new address gets a link, which works once, for {TOKEN_LIFETIME_WORDS["address change"]}; until
        it is used nothing changes.
      </p>
      <TextField
        name="address"
        label="New e-mail address"
        type="email"
        autoComplete="email"
        required
        defaultValue={answer?.typed}
        error={answer?.fault}
      />
      <ProofFields asked={proofAsked} fault={answer?.proofFault} label="Your password, for another address" />
      <SubmitButton busy="Sending">Send the link</SubmitButton>
    </Form>
  );
}

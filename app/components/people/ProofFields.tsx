import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";
import { CodeField } from "./CodeField.tsx";
import { PasswordField } from "./PasswordField.tsx";

const LATE = "You signed in more than ten minutes ago.";

interface Props {
  asked: ProofAsked;
  fault: ProofFault | undefined;
  /** what the password is for, where one page has more than one such form */
  label?: string;
  hint?: string;
}

/** The password, and the code of who has codes, where a form asks for them once more. */
export function ProofFields({ asked, fault, label = "Your password", hint = LATE }: Props) {
  if (asked === null) return null;
  const faultAt = (field: ProofFault["field"]) => (fault?.field === field ? fault.sentence : undefined);
  return (
    <>
      <PasswordField name="proof" label={label} hint={hint} error={faultAt("proof")} />
      {asked === "password and code" && (
        <CodeField name="proofCode" label="Your one-time code" error={faultAt("proofCode")} />
      )}
    </>
  );
}

import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import type { Role } from "#app/policies/roles.ts";
import { ROLES } from "#app/schemas/codes-required.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";

interface Props {
  codesFor: readonly Role[];
  /** what was ticked in a form that was refused */
  ticked: readonly string[] | undefined;
  proofAsked: ProofAsked;
  fault: ProofFault | undefined;
}

/** Which roles sign in with a one-time code beside their password. */
export function CodesRequired({ codesFor, ticked, proofAsked, fault }: Props) {
  const chosen: readonly string[] = ticked ?? codesFor;
  return (
    <section className="mt-8" aria-labelledby="codes">
      <h2 id="codes" className="font-semibold">
        Who signs in with a one-time code
      </h2>
      <p id="codes-about" className="mb-3 max-w-160 text-quiet">
        Whoever holds one of these roles in any program, or stands in for one who does, and has no one-time codes yet,
        sets them up on the next page that they open and can do nothing before. That may be you. Tokens of the API that
        are there already go on.
      </p>
      <Form key={codesFor.join()} method="post" className="frame max-w-160">
        <input type="hidden" name="intent" value="codes" />
        <fieldset className="grid gap-x-3 p-4 tablet:grid-cols-2 tablet:px-6" aria-describedby="codes-about">
          <legend className="sr-only">Roles</legend>
          {ROLES.map((role) => (
            <label key={role} className="flex min-h-8 items-center gap-2 max-tablet:min-h-11">
              <input
                type="checkbox"
                name="roles"
                value={role}
                defaultChecked={chosen.includes(role)}
                className="size-4 accent-ink"
              />
              {role.charAt(0).toUpperCase() + role.slice(1)}
            </label>
          ))}
        </fieldset>
        <div className="space-y-2 border-t border-line p-4 tablet:px-6">
          <ProofFields asked={proofAsked} fault={fault} />
          <SubmitButton busy="Saving">Save who needs a code</SubmitButton>
        </div>
      </Form>
    </section>
  );
}

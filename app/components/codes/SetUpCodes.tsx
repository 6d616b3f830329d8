import { Form } from "react-router";
import { CodeDrawing } from "#app/components/drawings/CodeDrawing.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { CodeField } from "#app/components/people/CodeField.tsx";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import type { CodesToConfirm } from "#app/schemas/own-codes.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";

interface Props {
  waiting: CodesToConfirm | null;
  proofAsked: ProofAsked;
  proofFault: ProofFault | undefined;
  codeFault: string | undefined;
}

/** Setting up one-time codes: first a secret for the app, then a first code that shows that it is there. */
export function SetUpCodes({ waiting, proofAsked, proofFault, codeFault }: Props) {
  if (!waiting)
    return (
      <Form method="post" className="max-w-160 space-y-2">
        <input type="hidden" name="intent" value="begin" />
        <p>
          You need an app that makes time-based one-time codes (RFC 6238), on a phone or another device that you have at
          hand where you sign in.
        </p>
        <ProofFields asked={proofAsked} fault={proofFault} />
        <SubmitButton busy="Making the code">Set up codes</SubmitButton>
      </Form>
    );
  const { secret, address, code } = waiting;
  return (
    <ol className="max-w-160 list-decimal space-y-4 pl-5">
      <li>
        Scan this with your app, or type the letters into it.
        <div className="mt-2 flex flex-wrap items-start gap-4">
          <div className="paper w-48 border">
            <CodeDrawing {...code} label="Code for your app" />
          </div>
          <div className="min-w-0 grow basis-48">
            <p className="text-label text-quiet">Secret to type: time-based, six digits, 30&nbsp;s</p>
            <p>
              <code className="wrap-anywhere select-all">{secret}</code>
            </p>
            <p className="mt-2">
              <a href={address} className="link">
                Open an app on this device
              </a>
            </p>
            <p className="mt-2 text-quiet">It is shown to nobody again once a first code was taken.</p>
          </div>
        </div>
      </li>
      <li>
        Type the code that the app shows now.
        <Form method="post" className="mt-2 space-y-2">
          <input type="hidden" name="intent" value="confirm" />
          <CodeField name="code" label="First code" digits error={codeFault} />
          <ProofFields asked={proofAsked} fault={proofFault} />
          <SubmitButton busy="Turning on">Turn codes on</SubmitButton>
        </Form>
      </li>
    </ol>
  );
}

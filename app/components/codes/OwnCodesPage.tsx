import { Form, Link } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { OwnCodes } from "#app/schemas/own-codes.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";
import { RecoveryCodes } from "./RecoveryCodes.tsx";
import { SetUpCodes } from "./SetUpCodes.tsx";

/** What the forms of the page answer. */
export interface CodesAnswer {
  intent: string;
  /** made just now */
  recovery?: string[];
  proofFault?: ProofFault;
  codeFault?: string;
}

interface Props extends OwnCodes {
  proofAsked: ProofAsked;
  turnedOff: boolean;
  answer: CodesAnswer | undefined;
}

/** A person's one-time codes: setting them up, recovery codes, turning them off. */
export function OwnCodesPage({ since, waiting, recovery, proofAsked, turnedOff, answer }: Props) {
  const faultOf = (intent: string) => (answer?.intent === intent ? answer.proofFault : undefined);
  return (
    <>
      <PageHead
        title="One-time codes"
        remark={since === null ? "Off" : `On since ${minuteOf(since)}`}
        crumbs={[{ name: "Account", path: "/account" }]}
      />
      {turnedOff && !answer && (
        <Notice kind="done" title="Your one-time codes are off. The password alone signs you in." />
      )}
      {answer?.recovery && (
        <Notice
          kind="done"
          title={
            answer.intent === "confirm"
              ? "One-time codes are on, and every other session of yours has ended. Keep your recovery codes:"
              : "Your new recovery codes. Those before work no more:"
          }
        >
          <RecoveryCodes codes={answer.recovery} />
        </Notice>
      )}
      {since === null || recovery === null ? (
        <HungSection title="Set up">
          <p className="max-w-160 pb-2 text-quiet">
            With codes on, whoever learns your password cannot sign in with it alone.
          </p>
          <SetUpCodes
            waiting={waiting}
            proofAsked={proofAsked}
            proofFault={answer?.proofFault}
            codeFault={answer?.codeFault}
          />
        </HungSection>
      ) : (
        <>
          <HungSection title="Recovery codes">
            <Form method="post" className="max-w-160 space-y-2">
              <input type="hidden" name="intent" value="renew" />
              <p>
                {recovery.left === 0
                  ? "None is left"
                  : recovery.left === 1
                    ? "One is left"
                    : `${recovery.left} are left`}{" "}
                of those made {minuteOf(recovery.madeAt)}
                {recovery.usedAt !== null && `, the last used ${minuteOf(recovery.usedAt)}`}. Make new ones when few are
                left or somebody may have seen them; those before work no more.
              </p>
              <ProofFields asked={proofAsked} fault={faultOf("renew")} label="Your password, for new ones" />
              <SubmitButton busy="Making">Make new recovery codes</SubmitButton>
            </Form>
          </HungSection>
          <HungSection title="Turn off">
            <Form method="post" className="max-w-160 space-y-2">
              <input type="hidden" name="intent" value="off" />
              <p>
                Every other session of yours ends. To move to another app, turn codes off and set them up again; where
                your role asks for them, that is the next page.
              </p>
              <ProofFields
                asked="password and code"
                fault={faultOf("off")}
                label="Your password, to turn off"
                hint=""
              />
              <SubmitButton busy="Turning off" removes>
                Turn codes off
              </SubmitButton>
            </Form>
          </HungSection>
        </>
      )}
      <p className="mt-2">
        <Link to="/account" className="link">
          Back to the account
        </Link>
      </p>
    </>
  );
}

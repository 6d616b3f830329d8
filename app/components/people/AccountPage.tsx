import { Form, Link } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { deviceWords } from "#app/lib/device-words.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { OwnSession } from "#app/schemas/own-account.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";
import { AddressForm, type AddressAnswer } from "./AddressForm.tsx";
import { PasswordField } from "./PasswordField.tsx";
import { ProofFields } from "./ProofFields.tsx";

const DONE = {
  ended: "That session has ended.",
  asked: "If the address is free, a mail with a link is on its way there. Nothing changes until the link is used.",
  address: "Your address is changed. Sign in with the new one from now on.",
  changed: "Your password is changed, and every other session of yours has ended.",
};

interface Props {
  name: string;
  email: string;
  sessions: readonly OwnSession[];
  hours: { idle: number; absolute: number };
  /** since when signing in asks for one-time codes; null where it does not */
  codesSince: string | null;
  proofAsked: ProofAsked;
  done: keyof typeof DONE | null;
  answer: AccountAnswer | undefined;
}

/** What was wrong in one of the forms. */
export interface AccountAnswer {
  password?: { current: string | undefined; password: string | undefined };
  address?: AddressAnswer;
  ending?: ProofFault;
}

/** A person's own account: where they are signed in, their password, codes and address. */
export function AccountPage({ name, email, sessions, hours, codesSince, proofAsked, done, answer }: Props) {
  return (
    <>
      <PageHead title="Account" remark={`${name}, ${email}`} />
      {done && !answer && <Notice kind="done" title={DONE[done]} />}
      <HungSection title="Signed in">
        <p className="max-w-160 pb-2 text-quiet">
          A session ends {hours.idle}&nbsp;hours after its last use, and {hours.absolute}&nbsp;hours after signing in
          whatever happens. End what you do not know, then change your password.
        </p>
        <Form method="post" className="max-w-160 space-y-2">
          <input type="hidden" name="intent" value="end" />
          <ul className="border-t border-line">
            {sessions.map((session) => (
              <Session key={session.id} {...session} />
            ))}
          </ul>
          {sessions.some(({ isThis }) => !isThis) && (
            <ProofFields asked={proofAsked} fault={answer?.ending} label="Your password, to sign out elsewhere" />
          )}
        </Form>
      </HungSection>
      <HungSection title="Password">
        <Form key={done} method="post" className="max-w-160 space-y-2">
          <input type="hidden" name="username" autoComplete="username" value={email} />
          <PasswordField name="current" label="Password now" error={answer?.password?.current} />
          <PasswordField name="password" label="New password" fresh error={answer?.password?.password} />
          <SubmitButton busy="Changing">Change the password</SubmitButton>
        </Form>
      </HungSection>
      <HungSection title="One-time codes">
        <p className="max-w-160">
          {codesSince === null
            ? "Off: the password alone signs you in."
            : `On since ${minuteOf(codesSince)}: signing in takes a code from your app beside the password.`}{" "}
          <Link to="/account/codes" className="link">
            {codesSince === null ? "Set up one-time codes" : "Recovery codes, turn off"}
          </Link>
        </p>
      </HungSection>
      <HungSection title="E-mail address">
        <AddressForm key={email} email={email} proofAsked={proofAsked} answer={answer?.address} />
      </HungSection>
    </>
  );
}

function Session({ id, userAgent, createdAt, lastSeenAt, isThis }: OwnSession) {
  const device = deviceWords(userAgent);
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-line py-3">
      <div className="min-w-0 grow wrap-anywhere">
        <p className="font-semibold">{device}</p>
        <p className="text-quiet">
          Signed in {minuteOf(createdAt)}, last seen {minuteOf(lastSeenAt)}
        </p>
      </div>
      {isThis ? (
        <p>This one</p>
      ) : (
        <button
          type="submit"
          name="session"
          value={id}
          className="btn"
          aria-label={`Sign out there: ${device}, signed in ${minuteOf(createdAt)}`}
        >
          Sign out there
        </button>
      )}
    </li>
  );
}

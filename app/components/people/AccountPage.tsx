import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { deviceWords } from "#app/lib/device-words.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { OwnSession } from "#app/schemas/own-account.ts";
import { PasswordField } from "./PasswordField.tsx";

const DONE = {
  ended: "That session has ended.",
  changed: "Your password is changed, and every other session of yours has ended.",
};

interface Props {
  name: string;
  email: string;
  sessions: readonly OwnSession[];
  hours: { idle: number; absolute: number };
  done: keyof typeof DONE | null;
  faults: { current: string | undefined; password: string | undefined } | undefined;
}

/** A person's own account: where they are signed in, and their password. */
export function AccountPage({ name, email, sessions, hours, done, faults }: Props) {
  return (
    <>
      <PageHead title="Account" remark={`${name}, ${email}`} />
      {done && !faults && <Notice kind="done" title={DONE[done]} />}
      <HungSection title="Signed in">
        <p className="max-w-160 pb-2 text-quiet">
          A session ends {hours.idle}&nbsp;hours after its last use, and {hours.absolute}&nbsp;hours after signing in
          whatever happens. End what you do not know, then change your password.
        </p>
        <ul className="max-w-160 border-t border-line">
          {sessions.map((session) => (
            <Session key={session.id} {...session} />
          ))}
        </ul>
      </HungSection>
      <HungSection title="Password">
        <Form key={done} method="post" className="max-w-160 space-y-2">
          <input type="hidden" name="username" autoComplete="username" value={email} />
          <PasswordField name="current" label="Password now" error={faults?.current} />
          <PasswordField name="password" label="New password" fresh error={faults?.password} />
          <SubmitButton busy="Changing">Change the password</SubmitButton>
        </Form>
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
        <Form method="post">
          <input type="hidden" name="intent" value="end" />
          <button
            type="submit"
            name="session"
            value={id}
            className="btn"
            aria-label={`Sign out there: ${device}, signed in ${minuteOf(createdAt)}`}
          >
            Sign out there
          </button>
        </Form>
      )}
    </li>
  );
}

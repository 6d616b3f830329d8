import { Form, Link } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { KIND_WORDS } from "#app/lib/mail/kind-words.ts";
import { MAIL_CHOICES, type MailChoice } from "#app/lib/mail/mail-choices.ts";
import type { MailChoiceRow } from "#app/schemas/mail-choice.ts";

const CHOICE_WORDS: Record<MailChoice, string> = {
  "at once": "At once",
  "daily digest": "In the daily digest",
  "not at all": "Not at all",
};

interface Props {
  email: string;
  kinds: MailChoiceRow[];
  /** hour of the day, UTC */
  digestHour: number;
  saved: boolean;
  /** whether this copy keeps its mail where it can be read */
  hasInbox: boolean;
  /** names of the fields, by their kinds */
  fields: Record<string, string>;
}

/** Of what Planeward mails a person, and when. */
export function MailChoicesPage({ email, kinds, digestHour, saved, fields, hasInbox }: Props) {
  const essential = kinds.filter((row) => row.essential);
  const chosen = kinds.filter((row) => !row.essential);
  return (
    <>
      <PageHead
        title="E-mail"
        crumbs={[{ name: "Preferences", path: "/preferences" }]}
        remark={`To ${email}`}
        actions={
          hasInbox && (
            <Link to="/mail" className="btn">
              The demo's mail
            </Link>
          )
        }
      />
      {saved && <Notice kind="done" title="Your choices are saved." />}
      {kinds.length === 0 ? (
        <p className="frame max-w-160 p-4 tablet:px-6">
          You belong to no program yet, so there is nothing to mail you about. An administrator adds you to one.
        </p>
      ) : (
        <Form method="post" className="frame max-w-160">
          {chosen.map(({ kind, choice }) => (
            <fieldset key={kind} className="border-b border-line p-4 tablet:px-6">
              <legend className="contents">
                <span className="font-semibold">{KIND_WORDS[kind]}</span>
              </legend>
              <div className="flex flex-wrap gap-x-6">
                {MAIL_CHOICES.map((value) => (
                  <label key={value} className="flex min-h-8 items-center gap-2 max-tablet:min-h-11">
                    <input type="radio" name={fields[kind]} value={value} defaultChecked={value === choice} />
                    {CHOICE_WORDS[value]}
                  </label>
                ))}
              </div>
            </fieldset>
          ))}
          {essential.length > 0 && (
            <section className="border-b border-line p-4 tablet:px-6">
              <h2 className="font-semibold">Always at once</h2>
              <ul className="list-disc pl-5">
                {essential.map(({ kind }) => (
                  <li key={kind}>{KIND_WORDS[kind]}</li>
                ))}
              </ul>
              <p className="mt-1 text-quiet">
                Somebody waits for you, or hands and wafers may be at risk, so these are not switched off.
              </p>
            </section>
          )}
          <p className="border-b border-line p-4 text-quiet tablet:px-6">
            The digest goes out at {String(digestHour).padStart(2, "0")}:00 UTC, on days when there is something for it.
            You are never mailed what you did yourself.
          </p>
          <div className="p-4 tablet:px-6">
            <SubmitButton busy="Saving">Save choices</SubmitButton>
          </div>
        </Form>
      )}
    </>
  );
}

import { Form } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { ACCOUNT_MAIL_WORDS, isAccountMail } from "#app/lib/account-mail.ts";
import { KIND_WORDS } from "#app/lib/mail/kind-words.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { MailState, OutboxRow } from "#app/schemas/outbox.ts";

/** How far a mail is, in words. */
export const MAIL_STATE_WORDS: Record<MailState, string> = {
  waiting: "Waits",
  sending: "Being sent",
  sent: "Sent",
  parked: "Parked",
  digest: "Waits for the digest",
  "in digest": "Went with a digest",
  dropped: "Dropped",
};

/** Columns of the outbox, by the names of their sorts. */
export const OUTBOX_COLUMNS: Column<OutboxRow>[] = [
  {
    key: "about",
    head: "About",
    cell: ({ kind, program }) => (
      <>
        {wordsOf(kind)}
        <span className="block text-label text-quiet">
          {program ?? (isAccountMail(kind) ? "No program" : "All programs of its reader")}
        </span>
      </>
    ),
  },
  {
    key: "to",
    head: "To",
    cell: ({ to, email }) => (
      <>
        <span className="wrap-anywhere">{to}</span>
        <span className="block text-label wrap-anywhere text-quiet max-tablet:hidden">{email}</span>
      </>
    ),
  },
  {
    key: "state",
    head: "State",
    cell: (row) => (
      <>
        <span className={row.state === "parked" ? "font-semibold text-stop" : ""}>{MAIL_STATE_WORDS[row.state]}</span>
        <span className="block text-label wrap-anywhere text-quiet">{howItStands(row)}</span>
      </>
    ),
  },
  { key: "written", head: "Written", sortable: true, wide: true, cell: ({ createdAt }) => minuteOf(createdAt) },
  {
    key: "again",
    head: "Again",
    cell: ({ id, state, to }) =>
      (state === "parked" || state === "waiting") && (
        <Form method="post">
          <button type="submit" name="mail" value={id} className="btn">
            Try again
            <span className="sr-only"> the mail to {to}</span>
          </button>
        </Form>
      ),
  },
];

function wordsOf(kind: OutboxRow["kind"]): string {
  if (kind === "digest") return "The daily digest";
  return isAccountMail(kind) ? ACCOUNT_MAIL_WORDS[kind] : KIND_WORDS[kind];
}

function howItStands({ state, attempts, reason, nextTryAt, sentAt }: OutboxRow): string {
  if (sentAt !== null) return minuteOf(sentAt);
  if (state !== "waiting" || attempts === 0) return reason;
  const tried = attempts === 1 ? "One attempt" : `${attempts} attempts`;
  return `${tried}, the next at ${minuteOf(nextTryAt)}. ${reason}`;
}

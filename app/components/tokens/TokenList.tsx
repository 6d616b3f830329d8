import { Form, useNavigation } from "react-router";
import { API_SCOPES, type TokenRow } from "#app/schemas/api-token.ts";

const STATES = { good: "good", expired: "over", revoked: "revoked" } as const;
const minuteOf = (iso: string) => `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;

/** Tokens, those that are good first. */
export function TokenList({ rows, ofAll }: { rows: TokenRow[]; ofAll: boolean }) {
  const sending = useNavigation().state === "submitting";
  return (
    <section aria-labelledby="tokens" className="frame">
      <h2 id="tokens" className="px-4 pt-3 pb-2 font-semibold">
        Tokens
      </h2>
      <ul>
        {rows.map(({ id, name, beginning, person, program, scopes, expiresAt, lastUsedAt, state }) => (
          <li
            key={id}
            className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-t border-line px-4 py-3 tablet:grid tablet:grid-cols-[minmax(0,1fr)_220px_96px]"
          >
            <div className="min-w-0 basis-full">
              <p className="wrap-anywhere">
                <span className="font-semibold">{name}</span>, {program}
                {ofAll && `, ${person}`}
              </p>
              <p className="wrap-anywhere text-quiet">
                <code>{beginning}…</code> {scopes.map((scope) => API_SCOPES[scope]).join("; ")}
              </p>
            </div>
            <p>
              {lastUsedAt ? `Last used ${minuteOf(lastUsedAt)}` : "Never used"}
              <span className={`block text-label ${state === "good" ? "font-semibold text-clear" : "text-quiet"}`}>
                {STATES[state]}
                {state !== "revoked" && `, until ${minuteOf(expiresAt)}`}
              </span>
            </p>
            {state !== "revoked" && (
              <Form method="post" className="tablet:text-right">
                <input type="hidden" name="token" value={id} />
                <button
                  type="submit"
                  name="intent"
                  value="revoke"
                  className="btn btn-remove"
                  disabled={sending}
                  aria-label={`Revoke ${name}, ${program}`}
                >
                  Revoke
                </button>
              </Form>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

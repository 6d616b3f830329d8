import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { listInbox } from "#app/services/mail/inbox.server.ts";
import type { Route } from "./+types/inbox";

export const meta: Route.MetaFunction = () => [{ title: "The demo's mail · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  return { email: scope.actor.email, mails: await listInbox(scope) };
}

export default function Inbox({ loaderData: { email, mails } }: Route.ComponentProps) {
  return (
    <>
      <PageHead
        title="The demo's mail"
        remark={`To ${email}`}
        actions={
          <Link to="/preferences/mail" className="btn">
            Choose what is mailed
          </Link>
        }
      />
      {mails.length === 0 ? (
        <EmptyState title="No mail yet">
          This copy names no mail server, so what Planeward mails you is kept here and goes nowhere else.
        </EmptyState>
      ) : (
        <>
          <ul className="frame max-w-240 divide-y divide-line">
            {mails.map(({ id, subject, arrivedAt }) => (
              <li key={id} className="flex flex-wrap items-baseline justify-between gap-x-6 p-3">
                <Link to={`/mail/${id}`} className="link min-w-0 wrap-anywhere">
                  {subject}
                </Link>
                <span className="text-label text-quiet">{minuteOf(arrivedAt)}</span>
              </li>
            ))}
          </ul>
          <p className="mt-3 text-label text-quiet">
            This copy names no mail server, so its mail is kept here and goes nowhere else. Nobody sees another's.
          </p>
        </>
      )}
    </>
  );
}

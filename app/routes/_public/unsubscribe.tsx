import { Form, Link, redirect, useNavigation } from "react-router";
import { PublicCard } from "#app/components/layout/PublicCard.tsx";
import { KIND_WORDS } from "#app/lib/mail/kind-words.ts";
import { ANNOUNCEMENT_KINDS } from "#app/lib/mail/mail-choices.ts";
import { requestIdContext } from "#app/server/contexts.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { askedToStop, stopMail, type Stopped } from "#app/services/mail/my-choices.server.ts";
import type { Route } from "./+types/unsubscribe";

export const meta: Route.MetaFunction = () => [
  { title: "Stop mail · Planeward" },
  { name: "robots", content: "noindex" },
];

/** What the link is about; nothing is stopped by opening it, since mail servers open links to look at them. */
export async function loader({ params, url, context }: Route.LoaderArgs) {
  const what = whatOf(url);
  const { email, kinds } = await askedToStop(params.token, what, context.get(requestIdContext));
  return { email, kinds, what, done: url.searchParams.has("done") };
}

/** Stops it: by the button, or by the one click of a reader of mail (RFC 8058). */
export async function action({ request, params, url, context }: Route.ActionArgs) {
  const what = whatOf(url);
  await stopMail(params.token, what, context.get(requestIdContext));
  // A reader of mail follows no redirect.
  if ((await request.formData()).get("List-Unsubscribe") === "One-Click") return null;
  throw redirect(`/unsubscribe/${params.token}?kind=${encodeURIComponent(what)}&done`);
}

function whatOf(url: URL): Stopped {
  const asked = url.searchParams.get("kind");
  const what = asked === "digest" ? asked : ANNOUNCEMENT_KINDS.find((kind) => kind === asked);
  if (!what) throw problem(400, "This link does not say which mail is to be stopped. Open it from the mail once more.");
  return what;
}

export default function Unsubscribe({ loaderData: { email, kinds, what, done } }: Route.ComponentProps) {
  const busy = useNavigation().state !== "idle";
  const named = what === "digest" ? "The daily digest" : `'${KIND_WORDS[what]}'`;
  return (
    <PublicCard>
      <div className="p-6">
        {kinds.length === 0 ? (
          <>
            <h1 className="text-answer font-medium">{done ? "It is stopped" : "There is nothing to stop"}</h1>
            <p role="status" className="mt-2 break-words">
              {named} is not mailed to {email}
              {done ? " any more." : "."} What asks you to act, or concerns hands and wafers at risk, still comes.
            </p>
          </>
        ) : (
          <>
            <h1 className="text-answer font-medium">Stop this mail?</h1>
            <p className="mt-2 break-words">
              {named} will not be mailed to {email} any more
              {what === "digest" && `: ${kinds.map((kind) => KIND_WORDS[kind].toLowerCase()).join(", ")}`}. Everything
              stays to be seen on the pages themselves.
            </p>
            <Form method="post" className="mt-4">
              <button type="submit" className="btn btn-primary" disabled={busy}>
                {busy ? "Stopping" : "Stop it"}
              </button>
            </Form>
          </>
        )}
        <p className="mt-4">
          <Link to="/preferences/mail" className="link">
            Choose what Planeward mails you
          </Link>{" "}
          <span className="text-quiet">(signed in)</span>
        </p>
      </div>
    </PublicCard>
  );
}

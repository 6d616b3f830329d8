import { PageHead } from "#app/components/layout/PageHead.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getMail } from "#app/services/mail/inbox.server.ts";
import type { Route } from "./+types/mail";

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${loaderData?.subject ?? "Mail"} · Planeward` }];

export async function loader({ context, params }: Route.LoaderArgs) {
  const { id, subject, from, to, text, arrivedAt } = await getMail(scopeOf(context), params.mailId);
  return { id, subject, from, to: to.join(", "), text, arrivedAt };
}

export default function Mail({ loaderData: { id, subject, from, to, text, arrivedAt } }: Route.ComponentProps) {
  return (
    <>
      <PageHead
        title={subject}
        crumbs={[{ name: "The demo's mail", path: "/mail" }]}
        remark={`From ${from} to ${to}, ${minuteOf(arrivedAt)}`}
      />
      <div className="grid gap-4 wide:grid-cols-2">
        <section className="frame min-w-0">
          <h2 className="border-b border-line px-4 py-2 font-semibold">As HTML</h2>
          <iframe
            src={`/mail/${id}/html`}
            title={`${subject}, as HTML`}
            sandbox="allow-popups allow-popups-to-escape-sandbox"
            className="block h-180 w-full"
          />
        </section>
        <section className="frame min-w-0">
          <h2 className="border-b border-line px-4 py-2 font-semibold">As text</h2>
          <pre className="overflow-x-auto p-4 font-mono text-label whitespace-pre-wrap wrap-anywhere">{text}</pre>
        </section>
      </div>
    </>
  );
}

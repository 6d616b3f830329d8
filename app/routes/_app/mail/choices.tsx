import { redirect } from "react-router";
import { MailChoicesPage } from "#app/components/mail/MailChoicesPage.tsx";
import { mailChoicesFormSchema, mailField } from "#app/schemas/mail-choice.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { environment } from "#app/server/environment.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { hasInbox } from "#app/services/mail/inbox.server.ts";
import { mailChoices, saveMailChoices } from "#app/services/mail/my-choices.server.ts";
import type { Route } from "./+types/choices";

export const meta: Route.MetaFunction = () => [{ title: "E-mail · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const kinds = await mailChoices(scope);
  return {
    email: scope.actor.email,
    kinds,
    fields: Object.fromEntries(kinds.map(({ kind }) => [kind, mailField(kind)])),
    digestHour: environment.MAIL_DIGEST_HOUR,
    hasInbox: hasInbox(),
    saved: url.searchParams.has("saved"),
  };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, mailChoicesFormSchema);
  if (submission.status !== "success")
    throw problem(400, "These choices could not be read. Open the page again and choose from it.");
  await saveMailChoices(scopeOf(context), submission.value);
  throw redirect("/preferences/mail?saved");
}

export default function MailChoicesRoute({ loaderData }: Route.ComponentProps) {
  return <MailChoicesPage {...loaderData} />;
}

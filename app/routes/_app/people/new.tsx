import { data, Form, redirect } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { RoleFields } from "#app/components/people/RoleFields.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { inviteSchema } from "#app/schemas/person-form.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { typedIn } from "#app/server/typed-in.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import { inviteForm } from "#app/services/people/list-people.server.ts";
import { invitePerson } from "#app/services/people/manage-people.server.ts";
import { proveAgain } from "#app/services/people/recent-proof.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "Invite somebody · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return inviteForm(scopeOf(context));
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "manage people");
  const { formData, submission } = await readForm(request, inviteSchema);
  const refused = (faults: Record<string, string[] | null | undefined>) =>
    data({ faults, typed: typedIn(formData), proofFault: undefined }, { status: 400 });
  if (submission.status !== "success") return refused(submission.reply().error ?? {});
  const { proof, proofCode, ...values } = submission.value;
  const proven = await proveAgain(scope, { proof, proofCode });
  if (proven.fault !== null)
    return data({ faults: null, typed: typedIn(formData), proofFault: proven.fault }, { status: 400 });
  const id = await invitePerson(proven.scope, values);
  if (id === null) return refused({ email: ["There is an account with this address already. Find it in the list."] });
  throw redirect(`/people/${id}?done=invited`);
}

export default function Invite({ loaderData: { programs, proofAsked }, actionData }: Route.ComponentProps) {
  const typed = actionData?.typed;
  const fault = (name: string) => actionData?.faults?.[name]?.[0];
  return (
    <>
      <PageHead title="Invite somebody" crumbs={[{ name: "People", path: "/people" }]} />
      <p className="max-w-160 pb-4">
        They get a mail with a link to set a password, which works once and for seven days. Until then nothing of a
        program is mailed to them.
      </p>
      <Form method="post" className="frame max-w-160 space-y-2 p-4 tablet:px-6">
        <TextField
          name="name"
          label="Name"
          required
          autoComplete="off"
          defaultValue={typed?.["name"]}
          error={fault("name")}
        />
        <TextField
          name="email"
          label="E-mail"
          type="email"
          required
          autoComplete="off"
          defaultValue={typed?.["email"]}
          error={fault("email")}
        />
        <RoleFields
          siteRole=""
          programs={programs}
          typed={typed}
          proofAsked={proofAsked}
          proofFault={actionData?.proofFault}
        />
        <SubmitButton busy="Inviting">Invite</SubmitButton>
      </Form>
    </>
  );
}

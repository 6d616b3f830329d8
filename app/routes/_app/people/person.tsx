import { data, Form, redirect } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import { PERSON_STATE_WORDS } from "#app/components/people/people-columns.tsx";
import { RoleFields } from "#app/components/people/RoleFields.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import { rolesSchema } from "#app/schemas/person-form.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { postedProof } from "#app/server/posted-proof.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { typedIn } from "#app/server/typed-in.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import { personPage } from "#app/services/people/list-people.server.ts";
import {
  changeRoles,
  deactivatePerson,
  inviteAgain,
  reactivatePerson,
  resetCodes,
  signOutEverywhere,
} from "#app/services/people/manage-people.server.ts";
import { proveAgain } from "#app/services/people/recent-proof.server.ts";
import type { Route } from "./+types/person";

const DONE = {
  invited: "The invitation is on its way.",
  roles: "The roles are changed. They count from the next page on.",
  out: "Every session of the account has ended. They may sign in again.",
  reset: "The one-time codes are taken off, and every session of the account has ended. A mail tells them.",
  deactivated: "The account is deactivated, and every session of it has ended.",
};

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.person.name ?? "A person"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const done = url.searchParams.get("done") ?? "";
  return {
    ...(await personPage(scopeOf(context), params.personId)),
    done: Object.hasOwn(DONE, done) ? DONE[done as keyof typeof DONE] : null,
  };
}

export async function action({ request, context, params: { personId } }: Route.ActionArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "manage people");
  const formData = await postedForm(request);
  const intent = formData.get("intent");
  const done = (what: keyof typeof DONE) => redirect(`/people/${personId}?done=${what}`);
  if (intent === "invite") {
    await inviteAgain(scope, personId);
    throw done("invited");
  }
  if (intent === "deactivate") {
    await deactivatePerson(scope, personId);
    throw done("deactivated");
  }
  const proven = await proveAgain(scope, postedProof(formData));
  if (proven.fault !== null)
    return data({ intent, proofFault: proven.fault, typed: typedIn(formData) }, { status: 400 });
  if (intent === "reactivate") {
    await reactivatePerson(proven.scope, personId);
    throw done("invited");
  }
  if (intent === "sign out") {
    await signOutEverywhere(proven.scope, personId);
    throw done("out");
  }
  if (intent === "reset codes") {
    await resetCodes(proven.scope, personId);
    throw done("reset");
  }
  const submission = parseForm(formData, rolesSchema);
  if (submission.status !== "success")
    throw problem(400, "These roles could not be read. Open the page again and choose from it.");
  await changeRoles(proven.scope, personId, submission.value);
  throw done("roles");
}

export default function PersonRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { person, programs, codesSince, isSelf, proofAsked, done } = loaderData;
  const { name, email, state, siteRole, lastSignInAt } = person;
  const faultOf = (intent: string) => (actionData?.intent === intent ? actionData.proofFault : undefined);
  return (
    <>
      <PageHead title={name} remark={PERSON_STATE_WORDS[state]} crumbs={[{ name: "People", path: "/people" }]} />
      {done && !actionData && <Notice kind="done" title={done} />}
      <p className="pb-4 wrap-anywhere">
        {email}. {lastSignInAt === null ? "Has never signed in." : `Signed in last ${minuteOf(lastSignInAt)}.`}
      </p>
      <HungSection title="Roles">
        {isSelf ? (
          <p>This is your own account. Another administrator changes its roles or deactivates it.</p>
        ) : (
          <Form method="post" className="max-w-160 space-y-2">
            <RoleFields
              siteRole={siteRole ?? ""}
              programs={programs}
              typed={actionData?.typed}
              proofAsked={proofAsked}
              proofFault={faultOf("roles")}
            />
            <input type="hidden" name="intent" value="roles" />
            <SubmitButton busy="Changing">Change the roles</SubmitButton>
          </Form>
        )}
      </HungSection>
      {!isSelf && codesSince !== null && (
        <HungSection title="One-time codes">
          <Form method="post" className="max-w-160 space-y-2">
            <input type="hidden" name="intent" value="reset codes" />
            <p>
              On since {minuteOf(codesSince)}. Reset them when neither the app nor a recovery code is at hand any more,
              and you are sure who asks: after that the password alone signs in.
            </p>
            <ProofFields asked={proofAsked} fault={faultOf("reset codes")} label="Your password, to reset" />
            <SubmitButton busy="Resetting" removes>
              Reset the codes
            </SubmitButton>
          </Form>
        </HungSection>
      )}
      {!isSelf && (
        <HungSection title="Account">
          <div className="max-w-160 space-y-4">
            {state === "active" && (
              <Form method="post" className="space-y-2">
                <input type="hidden" name="intent" value="sign out" />
                <p>A device is lost, or somebody else may be at it: end every session. The account stays as it is.</p>
                <ProofFields asked={proofAsked} fault={faultOf("sign out")} label="Your password, to sign them out" />
                <SubmitButton busy="Signing out">Sign out everywhere</SubmitButton>
              </Form>
            )}
            {state === "invited" && <Deed intent="invite" button="Send the invitation again" busy="Sending" />}
            {state !== "deactivated" ? (
              <Deed intent="deactivate" button="Deactivate" busy="Deactivating" removes>
                Every session and link ends at once. What they have done stays, under their name.
              </Deed>
            ) : (
              <Form method="post" className="space-y-2">
                <input type="hidden" name="intent" value="reactivate" />
                <p>They get a mail with a link to set a new password, and are active once it is set.</p>
                <ProofFields asked={proofAsked} fault={faultOf("reactivate")} label="Your password, to reactivate" />
                <SubmitButton busy="Reactivating">Reactivate</SubmitButton>
              </Form>
            )}
          </div>
        </HungSection>
      )}
    </>
  );
}

interface DeedProps {
  intent: string;
  button: string;
  busy: string;
  removes?: boolean;
  children?: string;
}

function Deed({ intent, button, busy, removes = false, children }: DeedProps) {
  return (
    <Form method="post" className="space-y-2">
      <input type="hidden" name="intent" value={intent} />
      {children && <p>{children}</p>}
      <SubmitButton busy={busy} removes={removes}>
        {button}
      </SubmitButton>
    </Form>
  );
}

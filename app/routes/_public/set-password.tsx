import { data, Form, redirect } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PublicCard } from "#app/components/layout/PublicCard.tsx";
import { PasswordField } from "#app/components/people/PasswordField.tsx";
import { requestIdContext } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { clearedSessionCookie } from "#app/server/session-cookie.server.ts";
import { passwordLink, setPasswordByLink } from "#app/services/people/set-password.server.ts";
import type { Route } from "./+types/set-password";

export const meta: Route.MetaFunction = () => [{ title: "Set a password · Planeward" }];

const gone = () =>
  problem(
    404,
    "This link does not work any more: it was used, replaced by a newer one, or has run out. Ask for a new one with 'I have forgotten my password' on the page to sign in.",
  );

/** Looks whether the link is good and leaves it so: programs that look through mail open links as well. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const link = await passwordLink(params.secret, context.get(requestIdContext));
  if (!link) throw gone();
  return link;
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const password = (await postedForm(request)).get("password");
  const set = await setPasswordByLink(
    params.secret,
    typeof password === "string" ? password : "",
    context.get(requestIdContext),
  );
  if (set.outcome === "gone") throw gone();
  if (set.outcome === "refused") return data({ fault: set.fault }, { status: 400 });
  // Whoever is signed in here, be it somebody else, signs in anew.
  throw redirect("/sign-in?set", { headers: { "Set-Cookie": await clearedSessionCookie(request) } });
}

export default function SetPassword({ loaderData: { email, isFirst }, actionData }: Route.ComponentProps) {
  return (
    <PublicCard>
      <div className="p-6">
        <h1 className="text-answer font-medium">{isFirst ? "Welcome: set your password" : "Set a new password"}</h1>
        <p className="mt-2 wrap-anywhere">
          For {email}. {!isFirst && "Every session of your account ends, on all devices."}
        </p>
        <Form method="post" className="mt-4 space-y-2">
          <input type="hidden" name="username" autoComplete="username" value={email} />
          <PasswordField name="password" label="New password" fresh error={actionData?.fault} />
          <SubmitButton busy="Setting">Set the password</SubmitButton>
        </Form>
      </div>
    </PublicCard>
  );
}

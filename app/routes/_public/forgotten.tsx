import { data, Form, Link } from "react-router";
import { z } from "zod";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PublicCard } from "#app/components/layout/PublicCard.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { TOKEN_LIFETIME_WORDS } from "#app/lib/account-mail.ts";
import { requestIdContext } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { askForPassword } from "#app/services/people/set-password.server.ts";
import type { Route } from "./+types/forgotten";

export const meta: Route.MetaFunction = () => [{ title: "Set a new password · Planeward" }];

const schema = z.object({ email: z.string().trim().min(3).max(200).includes("@") });

export async function action({ request, context }: Route.ActionArgs) {
  const parsed = schema.safeParse(Object.fromEntries(await postedForm(request)));
  if (!parsed.success)
    return data({ asked: false, error: "Type the e-mail address of your account, such as name@site.example." }, 400);
  await askForPassword(parsed.data.email, context.get(requestIdContext));
  return data({ asked: true, error: "" });
}

export default function Forgotten({ actionData }: Route.ComponentProps) {
  return (
    <PublicCard>
      <div className="p-6">
        {actionData?.asked ? (
          <>
            <h1 className="text-answer font-medium">Look into your mail</h1>
            <p role="status" className="mt-2">
              If there is an account with this address, a mail with a link is on its way. The link works once, for{" "}
              {TOKEN_LIFETIME_WORDS["password reset"]}. If nothing comes, look among unwanted mail, then ask your
              administrator.
            </p>
          </>
        ) : (
          <>
            <h1 className="text-answer font-medium">Set a new password</h1>
            <p className="mt-2">You get a mail with a link. Until you use it, your password stays as it is.</p>
            <Form method="post" className="mt-4 space-y-2">
              <TextField
                name="email"
                label="E-mail"
                type="email"
                autoComplete="username"
                required
                error={actionData?.error}
              />
              <SubmitButton busy="Sending">Send the link</SubmitButton>
            </Form>
          </>
        )}
        <p className="mt-4">
          <Link to="/sign-in" className="link">
            Back to signing in
          </Link>
        </p>
      </div>
    </PublicCard>
  );
}

import { Form, Link, redirect } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PublicCard } from "#app/components/layout/PublicCard.tsx";
import { actorContext, requestIdContext } from "#app/server/contexts.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { addressLink, confirmAddress } from "#app/services/people/change-address.server.ts";
import type { Route } from "./+types/confirm-address";

export const meta: Route.MetaFunction = () => [{ title: "Confirm your address · Planeward" }];

const gone = () =>
  problem(
    404,
    "This link does not work any more: it was used, replaced by a newer one, or has run out. Ask for a new one on your account's page.",
  );

/** Looks whether the link is good and leaves it so: programs that look through mail open links as well. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const link = await addressLink(params.secret, context.get(requestIdContext));
  if (!link) throw gone();
  return link;
}

export async function action({ context, params }: Route.ActionArgs) {
  if (!(await confirmAddress(params.secret, context.get(requestIdContext)))) throw gone();
  throw redirect(context.get(actorContext) ? "/account?done=address" : "/sign-in?address");
}

export default function ConfirmAddress({ loaderData: { name, address } }: Route.ComponentProps) {
  return (
    <PublicCard>
      <div className="p-6">
        <h1 className="text-answer font-medium">Confirm your new address</h1>
        <p className="mt-2 wrap-anywhere">
          {address} becomes the address of the account of {name}: you sign in with it, and mail goes there. The address
          before it is told.
        </p>
        <Form method="post" className="mt-4">
          <SubmitButton busy="Confirming">Confirm the address</SubmitButton>
        </Form>
        <p className="mt-4">
          <Link to="/" className="link">
            Leave it as it is
          </Link>
        </p>
      </div>
    </PublicCard>
  );
}

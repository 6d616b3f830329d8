import { data, Form, Link, redirect, useNavigation } from "react-router";
import { ThinningStory } from "#app/components/sign-in/ThinningStory.tsx";
import { Mark } from "#app/components/drawings/Mark.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { localPath } from "#app/lib/local-path.ts";
import { authenticator, signInSchema, SignInRefused, TooManyAttempts } from "#app/server/authenticator.server.ts";
import { actorContext, heldContext, requestIdContext } from "#app/server/contexts.server.ts";
import { halfCookie, sessionCookie } from "#app/server/session-cookie.server.ts";
import { thinningStory } from "#app/services/thinning-story.server.ts";
import { HALF_LIFETIME, halfSignedIn } from "#app/services/codes/half-signed-in.server.ts";
import { startSession } from "#app/services/sessions.server.ts";
import type { Route } from "./+types/sign-in";

/** What a link of a mail has done before it led here. */
const DONE = ["set", "address"] as const;

const PROMISE = "Flat and strong enough for every step, before any silicon is committed.";

/** Whoever follows a link without being signed in arrives here: what a message shows of any link is this page's card, and no more. */
export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: "Sign in · Planeward" },
  { name: "description", content: PROMISE },
  { property: "og:type", content: "website" },
  { property: "og:title", content: "Planeward" },
  { property: "og:description", content: PROMISE },
  { property: "og:image", content: `${loaderData?.origin ?? ""}/social-card.png` },
  { property: "og:image:width", content: "1200" },
  { property: "og:image:height", content: "630" },
  { property: "og:image:alt", content: `Planeward. ${PROMISE}` },
];

export function loader({ context, url }: Route.LoaderArgs) {
  if (context.get(actorContext)) throw redirect(localPath(url.searchParams.get("next")));
  if (context.get(heldContext)) throw redirect(`/sign-in/set-up${url.search}`);
  return { story: thinningStory(), origin: url.origin, done: DONE.find((each) => url.searchParams.has(each)) ?? null };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const parsed = signInSchema.safeParse(Object.fromEntries(await request.clone().formData()));
  if (!parsed.success) {
    const errors = Object.fromEntries(parsed.error.issues.map(({ path, message }) => [path.join("."), message]));
    return data({ errors: errors as Record<string, string>, email: "" }, { status: 400 });
  }
  try {
    const requestId = context.get(requestIdContext);
    const headers = new Headers(request.headers);
    headers.set("X-Request-Id", requestId);
    const personId = await authenticator.authenticate("form", new Request(request, { headers }));
    const half = await halfSignedIn(personId, requestId);
    if (half !== null)
      throw redirect(`/sign-in/code${url.search}`, {
        headers: { "Set-Cookie": await halfCookie(request, half, HALF_LIFETIME) },
      });
    const started = await startSession(personId, request.headers.get("User-Agent") ?? "", requestId);
    throw redirect(localPath(url.searchParams.get("next")), {
      headers: { "Set-Cookie": await sessionCookie(request, started) },
    });
  } catch (error) {
    const tooMany = error instanceof TooManyAttempts;
    if (!tooMany && !(error instanceof SignInRefused)) throw error;
    const form = tooMany ? error.message : `${error.message} Check both and try again.`;
    return data(
      { errors: { form } as Record<string, string>, email: parsed.data.email },
      { status: tooMany ? 429 : 400 },
    );
  }
}

export default function SignIn({ actionData, loaderData }: Route.ComponentProps) {
  const busy = useNavigation().state !== "idle";
  const errors = actionData?.errors;
  return (
    <main id="main" className="mx-auto max-w-page p-4 tablet:p-6">
      <div className="frame grid wide:grid-cols-[1fr_420px]">
        <ThinningStory {...loaderData.story} />
        <div className="flex flex-col border-ink max-wide:border-t wide:border-l">
          <div className="grow p-6">
            <p className="flex items-center gap-2 text-figure font-semibold">
              <Mark /> Planeward
            </p>
            <h1 className="mt-6 text-answer font-medium">{PROMISE}</h1>
          </div>
          {loaderData.done && (
            <p role="status" className="border-t border-line px-6 py-3">
              {loaderData.done === "set"
                ? "Your password is set. Sign in with it."
                : "Your address is changed. Sign in with the new one."}
            </p>
          )}
          <Form method="post" className="border-t border-ink" aria-label="Sign in">
            {errors?.["form"] && (
              <p role="alert" className="border-b border-line px-6 py-3 text-stop">
                {errors["form"]}
              </p>
            )}
            <div className="border-b border-line px-6 py-3">
              <TextField
                name="email"
                label="E-mail"
                type="email"
                autoComplete="username"
                required
                defaultValue={actionData?.email}
                error={errors?.["email"]}
              />
            </div>
            <div className="border-b border-line px-6 py-3">
              <TextField
                name="password"
                label="Password"
                type="password"
                autoComplete="current-password"
                required
                error={errors?.["password"]}
              />
            </div>
            <div className="px-6 py-4">
              <button type="submit" className="btn btn-primary w-full" disabled={busy}>
                {busy ? "Signing in" : "Sign in"}
              </button>
              <p className="mt-3">
                <Link to="/forgotten" className="link">
                  I have forgotten my password
                </Link>
              </p>
              <p className="mt-1 text-label text-quiet">No account: ask your administrator for an invitation.</p>
            </div>
          </Form>
        </div>
      </div>
    </main>
  );
}

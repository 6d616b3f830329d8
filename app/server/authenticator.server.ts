import { Authenticator } from "remix-auth";
import { FormStrategy } from "remix-auth-form";
import { z } from "zod";
import { PEER_HEADER } from "#app/server/connection.server.ts";
import { countAttempt, forgiveAttempt } from "#app/server/rate-limit.server.ts";
import { personWithPassword } from "#app/services/sign-in.server.ts";

/** What the sign-in form sends. */
export const signInSchema = z.object({
  email: z.string().trim().min(1, "Type the e-mail address of your account.").max(200),
  password: z.string().min(1, "Type your password.").max(1000),
});

/** The e-mail address and password do not belong together; which of the two is wrong is not said. */
export class SignInRefused extends Error {}

/** Too many attempts have failed; told in the same way whether there is such an account or not. */
export class TooManyAttempts extends Error {}

/** Proves who somebody is; the session that follows is ours. */
export const authenticator = new Authenticator<string>();

authenticator.use(
  new FormStrategy(async ({ form, request }) => {
    const { email, password } = signInSchema.parse(Object.fromEntries(form));
    const address = request.headers.get(PEER_HEADER) ?? "";
    const counted = [
      ["account from address", `${email} ${address}`],
      ["account", email],
      ["address", address],
    ] as const;
    if (!(await countAttempt(counted)))
      throw new TooManyAttempts("Too many attempts to sign in have failed. Wait a quarter of an hour, then try again.");
    const personId = await personWithPassword(email, password, request.headers.get("X-Request-Id") ?? "sign-in");
    if (personId) await forgiveAttempt(counted);
    if (!personId) throw new SignInRefused("E-mail address and password do not belong together.");
    return personId;
  }),
  "form",
);

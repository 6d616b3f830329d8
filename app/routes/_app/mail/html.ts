import { scopeOf } from "#app/server/contexts.server.ts";
import { getMail } from "#app/services/mail/inbox.server.ts";
import type { Route } from "./+types/html";

/** A mail's HTML may show itself and the picture that came with it: no script, no form, nothing from anywhere. */
const POLICY = [
  "default-src 'none'",
  "style-src 'unsafe-inline'",
  "img-src data:",
  "base-uri 'none'",
  "form-action 'none'",
  "frame-ancestors 'self'",
  "sandbox allow-popups allow-popups-to-escape-sandbox",
].join("; ");

/** The HTML of a mail, for the frame on its page. Its links open beside it, where they work as they would from a reader of mail. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const { html } = await getMail(scopeOf(context), params.mailId);
  return new Response(html.replaceAll("<a ", '<a target="_blank" rel="noopener" '), {
    headers: { "Content-Type": "text/html; charset=utf-8", "Content-Security-Policy": POLICY },
  });
}

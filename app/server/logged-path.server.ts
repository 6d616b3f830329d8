const SECRET = /^\/(unsubscribe|set-password|confirm-address)\/[^/]+/;

/** The path of a request as the log has it: the secret of a link in a mail is left out of it. */
export function loggedPath(request: Request): string {
  return new URL(request.url).pathname.replace(SECRET, "/$1/…");
}

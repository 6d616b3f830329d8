/** The path of a request as the log has it: what opens somebody's choices of mail is left out of it. */
export function loggedPath(request: Request): string {
  return new URL(request.url).pathname.replace(/^\/unsubscribe\/[^/]+/, "/unsubscribe/…");
}

import { createCookie } from "react-router";
import type { StartedSession } from "#app/services/sessions.server.ts";

const cookie = createCookie("planeward_session", { path: "/", httpOnly: true, sameSite: "lax" });

/** Over https the cookie is marked secure; on plain loopback http browsers and tools would drop it. */
const isSecure = (request: Request) => new URL(request.url).protocol === "https:";

/** The session token that a request brings. */
export async function tokenOf(request: Request): Promise<string | null> {
  const value: unknown = await cookie.parse(request.headers.get("Cookie"));
  return typeof value === "string" && value.length > 0 ? value : null;
}

/** The header that hands a session to the browser. */
export function sessionCookie(request: Request, { token, expiresAt }: StartedSession): Promise<string> {
  return cookie.serialize(token, { expires: expiresAt, secure: isSecure(request) });
}

/** The header that takes it away. */
export function clearedSessionCookie(request: Request): Promise<string> {
  return cookie.serialize("", { maxAge: 0, secure: isSecure(request) });
}

import { createCookie } from "react-router";
import { isOverTls } from "./over-tls.server.ts";
import type { StartedSession } from "#app/services/sessions.server.ts";

const SHARED = { path: "/", httpOnly: true, sameSite: "lax" } as const;
/** Bound to this very host by the browser itself, which only TLS allows. */
const overTls = createCookie("__Host-planeward_session", { ...SHARED, secure: true });
/** On plain loopback http browsers and tools would drop a cookie that is marked secure. */
const onLoopback = createCookie("planeward_session", SHARED);

const cookieFor = (request: Request) => (isOverTls(request) ? overTls : onLoopback);

/** The session token that a request brings. */
export async function tokenOf(request: Request): Promise<string | null> {
  const value: unknown = await cookieFor(request).parse(request.headers.get("Cookie"));
  return typeof value === "string" && value.length > 0 ? value : null;
}

/** The header that hands a session to the browser. */
export function sessionCookie(request: Request, { token, expiresAt }: StartedSession): Promise<string> {
  return cookieFor(request).serialize(token, { expires: expiresAt });
}

/** The header that takes it away. */
export function clearedSessionCookie(request: Request): Promise<string> {
  return cookieFor(request).serialize("", { maxAge: 0 });
}

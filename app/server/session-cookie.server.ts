import { createCookie, type Cookie } from "react-router";
import { isOverTls } from "./over-tls.server.ts";
import type { StartedSession } from "#app/services/sessions.server.ts";

const SHARED = { path: "/", httpOnly: true, sameSite: "lax" } as const;
/** Bound to this very host by the browser itself, which only TLS allows. */
const overTls = createCookie("__Host-planeward_session", { ...SHARED, secure: true });
/** On plain loopback http browsers and tools would drop a cookie that is marked secure. */
const onLoopback = createCookie("planeward_session", SHARED);

/** Between the password and the code. */
const halfOverTls = createCookie("__Host-planeward_half", { ...SHARED, secure: true });
const halfOnLoopback = createCookie("planeward_half", SHARED);

const cookieFor = (request: Request) => (isOverTls(request) ? overTls : onLoopback);
const halfCookieFor = (request: Request) => (isOverTls(request) ? halfOverTls : halfOnLoopback);

async function valueOf(cookie: Cookie, request: Request): Promise<string | null> {
  const value: unknown = await cookie.parse(request.headers.get("Cookie"));
  return typeof value === "string" && value.length > 0 ? value : null;
}

/** The session token that a request brings. */
export const tokenOf = (request: Request): Promise<string | null> => valueOf(cookieFor(request), request);

/** The header that hands a session to the browser. */
export function sessionCookie(request: Request, { token, expiresAt }: StartedSession): Promise<string> {
  return cookieFor(request).serialize(token, { expires: expiresAt });
}

/** The header that takes it away. */
export function clearedSessionCookie(request: Request): Promise<string> {
  return cookieFor(request).serialize("", { maxAge: 0 });
}

/** What a request brings of somebody who has given their password and not their code yet. */
export const halfOf = (request: Request): Promise<string | null> => valueOf(halfCookieFor(request), request);

/** The header that hands it to the browser. */
export function halfCookie(request: Request, half: string, lifetime: number): Promise<string> {
  return halfCookieFor(request).serialize(half, { maxAge: lifetime / 1000 });
}

/** The header that takes it away. */
export function clearedHalfCookie(request: Request): Promise<string> {
  return halfCookieFor(request).serialize("", { maxAge: 0 });
}

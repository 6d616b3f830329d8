import { randomBytes } from "node:crypto";
import type { MiddlewareFunction } from "react-router";
import { environment } from "#app/server/environment.server.ts";
import { nonceContext } from "#app/server/contexts.server.ts";

/** Scripts only with this request's nonce; inline style attributes are what charts and drawings position themselves with. */
function contentSecurityPolicy(nonce: string): string {
  const development = environment.NODE_ENV === "development";
  return [
    "default-src 'self'",
    `script-src 'nonce-${nonce}' ${development ? "'self' 'unsafe-inline'" : "'strict-dynamic'"}`,
    `style-src 'self' ${development ? "'unsafe-inline'" : `'nonce-${nonce}'`}`,
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data:",
    "font-src 'self'",
    `connect-src 'self'${development ? " ws:" : ""}`,
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}

const FLOOR = /^\/floor(?:\/|$)/;

/** Headers that every answer carries. */
export const securityHeaders: MiddlewareFunction<Response> = async ({ context, request }, next) => {
  const nonce = randomBytes(16).toString("base64");
  context.set(nonceContext, nonce);
  const response = await next();
  const { headers } = response;
  // What is not a page of ours, such as a mail that is looked at, says itself how little it may.
  if (!headers.has("Content-Security-Policy")) headers.set("Content-Security-Policy", contentSecurityPolicy(nonce));
  headers.set("Referrer-Policy", "same-origin");
  headers.set("Cross-Origin-Opener-Policy", "same-origin");
  // Codes are read on the floor, whose pages are documents of their own.
  const camera = FLOOR.test(new URL(request.url).pathname) ? "self" : "";
  headers.set("Permissions-Policy", `camera=(${camera}), geolocation=(), microphone=()`);
  if (!headers.has("Cache-Control")) headers.set("Cache-Control", "private, no-store");
  return response;
};

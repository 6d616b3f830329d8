import type { MiddlewareFunction } from "react-router";
import { bearerContext } from "#app/server/contexts.server.ts";
import { environment } from "#app/server/environment.server.ts";
import { log } from "#app/server/log.server.ts";
import { loggedPath } from "#app/server/logged-path.server.ts";

const SAFE = new Set(["GET", "HEAD", "OPTIONS"]);

/** Whether a request that changes something comes from our own pages. Browsers always say where a post comes from. */
export function comesFromUs(request: Request, allowed: readonly string[]): boolean {
  if (SAFE.has(request.method)) return true;
  const origin = request.headers.get("Origin");
  if (origin !== null) return origin === new URL(request.url).origin || allowed.includes(origin);
  const site = request.headers.get("Sec-Fetch-Site");
  return site === null || site === "same-origin" || site === "none";
}

/** Refuses a change asked for by another site's page; the router's own check leaves resource routes out. */
export const originCheck: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  // No browser adds a token by itself, so a request with one was meant by who holds it.
  if (context.get(bearerContext) || comesFromUs(request, environment.ALLOWED_ORIGINS)) return next();
  log.warn({ origin: request.headers.get("Origin"), path: loggedPath(request) }, "foreign origin refused");
  return new Response("This request came from another site, so it was not carried out.\n", {
    status: 403,
    headers: { "Content-Type": "text/plain; charset=utf-8" },
  });
};

import { createContext, type RouterContextProvider } from "react-router";
import type { Actor } from "#app/policies/roles.ts";
import type { ActorScope, SessionOfScope } from "./scope.server.ts";
import type { TokenBearer } from "#app/services/api/token-actor.server.ts";

/** Set by middleware for everything below it. */
export const requestIdContext = createContext<string>("");
export const nonceContext = createContext<string>("");
export const sessionContext = createContext<SessionOfScope | null>(null);
export const actorContext = createContext<Actor | null>(null);
/** somebody who has to set up one-time codes before anything else: to every page but that one they are nobody */
export const heldContext = createContext<{ actor: Actor; session: SessionOfScope } | null>(null);
/** set where a request of the API came with a token; its cookie then counts for nothing */
export const bearerContext = createContext<TokenBearer | null>(null);

/**
 * The scope of a request that needs a signed-in person. The session middleware has already sent everybody else away, so a
 * missing actor here is a route outside the signed-in layout.
 */
export function scopeOf(context: Readonly<RouterContextProvider>): ActorScope {
  const actor = context.get(actorContext);
  if (!actor) throw new Error("This route is not behind the signed-in layout.");
  const onlyProgram = context.get(bearerContext)?.programId;
  return {
    actor,
    session: context.get(sessionContext),
    requestId: context.get(requestIdContext),
    ...(onlyProgram && { onlyProgram }),
  };
}

/** The scope of who has to set up one-time codes before anything else; null for everybody else. */
export function heldScopeOf(context: Readonly<RouterContextProvider>): ActorScope | null {
  const held = context.get(heldContext);
  return held && { ...held, requestId: context.get(requestIdContext) };
}

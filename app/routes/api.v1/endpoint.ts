import { actorContext, bearerContext, scopeOf } from "#app/server/contexts.server.ts";
import { answerApi } from "#app/services/api/answer.server.ts";
import type { Route } from "./+types/endpoint";

/** Every operation of the API: which one, and what it takes and gives, stands in the registry that its document is made from too. */
export function loader({ request, context }: Route.LoaderArgs) {
  const scope = context.get(actorContext) ? scopeOf(context) : null;
  return answerApi({ request, scope, bearer: context.get(bearerContext) });
}

export const action = (args: Route.ActionArgs) => loader(args);

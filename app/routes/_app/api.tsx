import { ApiPage } from "#app/components/api/ApiPage.tsx";
import { apiReference } from "#app/services/api/reference.server.ts";
import type { Route } from "./+types/api";

export const meta: Route.MetaFunction = () => [{ title: "API · Planeward" }];

/** The reference says nothing of anybody's work, so everybody who is signed in may read it. */
export const loader = () => apiReference();

export default function Api({ loaderData }: Route.ComponentProps) {
  return <ApiPage {...loaderData} />;
}

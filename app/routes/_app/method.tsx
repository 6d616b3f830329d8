import { MethodView } from "#app/components/method/MethodView.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { ruleTexts } from "#app/services/rule-texts.server.ts";
import type { Route } from "./+types/method";

export const meta: Route.MetaFunction = () => [{ title: "Method · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return { rules: await ruleTexts(scopeOf(context)), engineVersion: ENGINE_VERSION };
}

export default function Method({ loaderData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="Method" remark="How every figure comes about, and what it does not know" />
      <MethodView {...loaderData} />
    </>
  );
}

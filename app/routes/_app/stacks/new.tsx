import { redirect } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { STACK_FORM } from "#app/components/stacks/stack-fields.ts";
import { StackEditor } from "#app/components/stacks/StackEditor.tsx";
import { useOwnSave } from "#app/components/stacks/use-own-save.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { newStackPage } from "#app/services/stack-page.server.ts";
import { postedStack } from "./stack-form.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "New stack · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return newStackPage(scopeOf(context), url.searchParams);
}

export async function action({ request, context }: Route.ActionArgs) {
  const { again, savedAs } = await postedStack(scopeOf(context), request, null);
  if (again) return again;
  throw redirect(`/stacks/${savedAs}`);
}

export default function NewStack({ loaderData, actionData }: Route.ComponentProps) {
  const { saved } = useOwnSave(actionData?.lastResult);
  return (
    <>
      <PageHead
        title="New stack"
        crumbs={[{ name: "Stacks", path: "/stacks" }]}
        actions={
          <SubmitButton busy="Saving" form={STACK_FORM}>
            Save stack
          </SubmitButton>
        }
      />
      <StackEditor
        {...loaderData}
        {...actionData}
        stackId={null}
        version={null}
        lastResult={actionData?.lastResult}
        conflict={null}
        saved={saved}
      />
    </>
  );
}

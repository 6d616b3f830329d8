import { Link, redirect } from "react-router";
import { ChangedNotice } from "#app/components/changes/ChangedNotice.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { RemoveStack } from "#app/components/stacks/RemoveStack.tsx";
import { STACK_FORM } from "#app/components/stacks/stack-fields.ts";
import { StackEditor } from "#app/components/stacks/StackEditor.tsx";
import { StackReading } from "#app/components/stacks/StackReading.tsx";
import { useOwnSave } from "#app/components/stacks/use-own-save.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { stackPage } from "#app/services/stack-page.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import { postedStack } from "./stack-form.server.ts";
import type { Route } from "./+types/stack";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.stack.name ?? "Stack"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return stackPage(scopeOf(context), params.stackId, url.searchParams);
}

export async function action({ request, context, params, url }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const id = idFrom(params.stackId, "stack");
  const { again } = await postedStack(scope, request, id);
  if (again) return again;
  throw redirect(`/stacks/${id}${url.search}`);
}

export default function Stack({ loaderData, actionData }: Route.ComponentProps) {
  const { stack, ...page } = loaderData;
  const { id, name, program, stamp, mayEdit } = stack;
  const { saved, saves } = useOwnSave(actionData?.lastResult);
  return (
    <>
      <PageHead
        title={name}
        crumbs={[{ name: "Stacks", path: "/stacks" }]}
        remark={`${program.name}. Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
        actions={
          <>
            <Link to={`/stacks/compare?of=${id}`} className="btn">
              Compare
            </Link>
            <Link to={`/stacks/${id}/sweep`} className="btn">
              Sweep
            </Link>
            {mayEdit && (
              <>
                <Link to={`/stacks/new?from=${id}`} className="btn">
                  Copy
                </Link>
                <Link to={`/flows/new?stack=${id}`} className="btn">
                  Use in a flow
                </Link>
                <SubmitButton busy="Saving" form={STACK_FORM}>
                  Save stack
                </SubmitButton>
              </>
            )}
          </>
        }
      />
      <ChangedNotice
        of={`stack:${id}`}
        since={String(stamp.version)}
        title="Somebody has saved this stack since you opened it."
      >
        {mayEdit ? "When you save, you choose what stays of both." : "What you see is the stack as it was."}
      </ChangedNotice>
      {mayEdit ? (
        <StackEditor
          key={`${id} ${saves}`}
          {...page}
          {...actionData}
          stackId={id}
          version={actionData?.version ?? stamp.version}
          programs={null}
          lastResult={actionData?.lastResult}
          conflict={actionData?.conflict}
          saved={saved}
        />
      ) : (
        <StackReading key={id} {...page} />
      )}
      {mayEdit && <RemoveStack name={name} />}
    </>
  );
}

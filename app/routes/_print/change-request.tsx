import { ChangeRequestPaper } from "#app/components/assessments/ChangeRequestPaper.tsx";
import { customerChange } from "#app/lib/customer-change.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { changeRequestPage } from "#app/services/assessments/change-request-page.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import type { Route } from "./+types/change-request";

export const meta: Route.MetaFunction = () => [{ title: "Change request · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { form, reach, programs } = await changeRequestPage(scope, url.searchParams);
  // A page for a customer is of one program, or it would name two.
  const program = programs.find(({ value }) => value === form.fields.program);
  if (!reach || !form.question || !form.subject || !program)
    throw problem(400, "This page needs a whole question and one of your programs. Go back and ask it again.");
  return {
    change: customerChange(reach, {
      question: form.question,
      kind: form.subject.kind,
      program: program.label,
      preparedBy: scope.actor.name,
      date: new Date().toISOString().slice(0, 10),
    }),
    paper: await paperFor(scope, url),
    back: `/assessments/change-request?${new URLSearchParams({ ...form.fields }).toString()}`,
  };
}

export default function ChangeRequestPrint({ loaderData }: Route.ComponentProps) {
  return <ChangeRequestPaper {...loaderData} />;
}

import { data, redirect } from "react-router";
import { ReferenceForm } from "#app/components/instruments/ReferenceForm.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { referenceReadingSchema } from "#app/schemas/instrument.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { addReferenceReading, referenceForm } from "#app/services/instruments/reference-readings.server.ts";
import type { Route } from "./+types/reference";

export const meta: Route.MetaFunction = () => [{ title: "New reading of a reference wafer · Planeward" }];

export async function loader({ context, params }: Route.LoaderArgs) {
  const form = await referenceForm(scopeOf(context), params.instrumentId);
  return { ...form, today: new Date().toISOString().slice(0, 10) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const { submission } = await readForm(request, referenceReadingSchema);
  if (submission.status !== "success") return data({ lastResult: submission.reply() }, { status: 400 });
  const added = await addReferenceReading(scopeOf(context), params.instrumentId, submission.value);
  if (added.outcome === "stored") throw redirect(`/instruments/${params.instrumentId}`);
  return data({ lastResult: submission.reply({ fieldErrors: { [added.field]: [added.reason] } }) }, { status: 409 });
}

export default function NewReading({ loaderData, actionData }: Route.ComponentProps) {
  const { instrument, wafers, today } = loaderData;
  const back = `/instruments/${instrument.id}`;
  return (
    <>
      <PageHead
        title="New reading of a wafer of known bow"
        crumbs={[
          { name: "Instruments", path: "/instruments" },
          { name: instrument.name, path: back },
        ]}
      />
      <ReferenceForm wafers={wafers} today={today} lastResult={actionData?.lastResult} back={back} />
    </>
  );
}

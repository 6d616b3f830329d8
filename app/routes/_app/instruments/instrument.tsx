import { data, redirect } from "react-router";
import { InstrumentView } from "#app/components/instruments/InstrumentView.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { setAsideSchema } from "#app/schemas/instrument.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { getInstrument } from "#app/services/instruments/get-instrument.server.ts";
import { setAside } from "#app/services/instruments/set-aside.server.ts";
import type { Route } from "./+types/instrument";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.instrument.name ?? "Instrument"} · Instruments · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return { instrument: await getInstrument(scopeOf(context), params.instrumentId) };
}

/** Sets a study or a reading aside. */
export async function action({ request, context, params }: Route.ActionArgs) {
  const { submission } = await readForm(request, setAsideSchema);
  if (submission.status !== "success") {
    const [fault = "That cannot be set aside. Open the page again."] = submission.error?.["reason"] ?? [];
    return data({ fault }, { status: 400 });
  }
  await setAside(scopeOf(context), params.instrumentId, submission.value);
  throw redirect(`/instruments/${params.instrumentId}`);
}

export default function Instrument({ loaderData: { instrument }, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title={instrument.name} crumbs={[{ name: "Instruments", path: "/instruments" }]} />
      {actionData && <Notice kind="error" title={actionData.fault} />}
      <InstrumentView instrument={instrument} />
    </>
  );
}

import { data, redirect } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { WaitingView } from "#app/components/scans/waiting/WaitingView.tsx";
import { mayInProgram } from "#app/policies/permissions.ts";
import { waferPlaceSchema } from "#app/schemas/wafer-place.ts";
import { handPairSchema } from "#app/schemas/waiting.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import { moveWaiting, pairByHand } from "#app/services/wafers/hand-pairing.server.ts";
import { removeWaiting } from "#app/services/wafers/undo-import.server.ts";
import { getWaiting } from "#app/services/wafers/waiting.server.ts";
import type { Route } from "./+types/waiting-file";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.file.label ?? "File"} · Files that wait · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const file = await getWaiting(scope, params.waferScanId);
  const films = await allOfLibrary(scope, "film");
  return {
    file,
    films: films.map(({ id, name }) => ({ value: id, label: name })),
    mayUpload: mayInProgram(scope.actor, "upload scans", file.program.id),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const form = await postedForm(request);
  switch (form.get("intent")) {
    case "pair":
      return pair(scope, params.waferScanId, form);
    case "move":
      return move(scope, params.waferScanId, form);
    case "remove": {
      const removed = await removeWaiting(scope, params.waferScanId);
      if (removed.outcome === "used") throw problem(409, removed.sentence);
      throw redirect("/scans/waiting");
    }
    default:
      throw problem(400, "This form could not be read. Open the page again and send it once more.");
  }
}

async function pair(scope: ActorScope, id: string, form: FormData) {
  const submission = parseForm(form, handPairSchema);
  if (submission.status !== "success") return data({ pair: submission.reply(), move: null }, { status: 400 });
  const done = await pairByHand(scope, id, submission.value);
  if (done.outcome === "scan") throw redirect(`/scans/${done.scan}`);
  return data({ pair: submission.reply(faultOf(done)), move: null }, { status: 400 });
}

async function move(scope: ActorScope, id: string, form: FormData) {
  const submission = parseForm(form, waferPlaceSchema);
  if (submission.status !== "success") return data({ pair: null, move: submission.reply() }, { status: 400 });
  const done = await moveWaiting(scope, id, submission.value);
  if (done.outcome === "scan") throw redirect(`/scans/${done.scan}`);
  if (done.outcome === "moved") throw redirect(`/scans/waiting/${id}`);
  // What only a pair asks for has no field here: the place stands, and the two are put together by hand.
  return data({ pair: null, move: submission.reply({ formErrors: [done.reason] }) }, { status: 400 });
}

const faultOf = ({ field, reason }: { field: string | null; reason: string }) =>
  field === null ? { formErrors: [reason] } : { fieldErrors: { [field]: [reason] } };

export default function WaitingFile({ loaderData, actionData }: Route.ComponentProps) {
  const { file } = loaderData;
  return (
    <>
      <PageHead
        title={file.label}
        crumbs={[
          { name: "Scans", path: "/scans" },
          { name: "Files that wait", path: "/scans/waiting" },
        ]}
        remark={`${file.program.name}, ${file.side} the film, waits since ${file.createdAt.slice(0, 10)}`}
      />
      <WaitingView key={file.id} {...loaderData} answers={actionData ?? null} />
    </>
  );
}

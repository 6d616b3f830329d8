import { redirect } from "react-router";
import { JobList } from "#app/components/jobs/JobList.tsx";
import { useLookingAgain } from "#app/components/jobs/use-looking-again.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { listJobs, startJobAgain, stopJob } from "#app/services/jobs/jobs.server.ts";
import type { Route } from "./+types/jobs";

export const meta: Route.MetaFunction = () => [{ title: "Work under way · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return { jobs: await listJobs(scopeOf(context)) };
}

export async function action({ request, context }: Route.ActionArgs) {
  const form = await request.formData();
  const id = String(form.get("job") ?? "");
  switch (form.get("intent")) {
    case "stop":
      await stopJob(scopeOf(context), id);
      break;
    case "start":
      await startJobAgain(scopeOf(context), id);
      break;
    default:
      throw problem(400, "This form could not be read. Open the page again and send it once more.");
  }
  throw redirect("/jobs");
}

export default function Jobs({ loaderData: { jobs } }: Route.ComponentProps) {
  const underWay = jobs.filter(({ state }) => state === "waiting" || state === "running").length;
  useLookingAgain(underWay > 0);
  return (
    <>
      <PageHead
        title="Work under way"
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={underWay === 0 ? "Nothing is waiting or running" : `${underWay} waiting or running`}
      />
      {jobs.length > 0 ? (
        <JobList jobs={jobs} />
      ) : (
        <EmptyState title="Nothing here yet">
          Files that take longer to read than a page should wait stand here, with how far they are and how they ended.
        </EmptyState>
      )}
    </>
  );
}

import { Link, redirect, useRevalidator } from "react-router";
import { useChanges } from "#app/components/changes/use-changes.ts";
import { JobList } from "#app/components/jobs/JobList.tsx";
import { JOB_WORDS } from "#app/components/jobs/job-words.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { KEPT_POINTS } from "#app/lib/scan-reading/profile-points.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { JOB_STATES } from "#app/schemas/job.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { JOB_SORTS, listJobs, startJobAgain, stopJob } from "#app/services/jobs/jobs.server.ts";
import type { Route } from "./+types/jobs";

export const meta: Route.MetaFunction = () => [{ title: "Work under way · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: JOB_SORTS, filters: ["program", "state"] });
  const jobs = await listJobs(scope, params);
  const programs = programsWhere(scope.actor, "see the work");
  return {
    jobs,
    programs: programs.map(({ programName, programSlug }) => ({ value: programSlug, label: programName })),
    mayUpload: programsWhere(scope.actor, "upload scans").length > 0,
    searched: params.query !== "" || Object.values(params.filters).some(Boolean),
  };
}

export async function action({ request, context, url }: Route.ActionArgs) {
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
  throw redirect(`/jobs${url.search}`);
}

export default function Jobs({ loaderData: { jobs, programs, searched, mayUpload } }: Route.ComponentProps) {
  const open = jobs.filter(({ state }) => state === "waiting" || state === "running");
  const underWay = open.length;
  const { revalidate } = useRevalidator();
  useChanges(
    open.map(({ id }) => `job:${id}` as const),
    "",
    { own: true, changed: () => void revalidate() },
  );
  return (
    <>
      <PageHead
        title="Work under way"
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={underWay === 0 ? "Nothing is waiting or running" : `${underWay} waiting or running`}
        actions={
          underWay > 0 && (
            <noscript>
              <a href="/jobs" className="btn">
                Look again
              </a>
            </noscript>
          )
        }
      />
      <ListHead
        what="files, wafers and people"
        filters={[
          { name: "program", label: "Program", options: programs },
          { name: "state", label: "State", options: JOB_STATES.map((value) => ({ value, label: JOB_WORDS[value] })) },
        ]}
      />
      {jobs.length > 0 ? (
        <>
          <JobList jobs={jobs} />
          <p className="mt-3 text-label text-quiet">
            Every file is kept as it came, and every point of it is fitted. Of a profile with more than {KEPT_POINTS}{" "}
            points the means of as many equal stretches are kept beside the fit, for drawing and for CSV.
          </p>
        </>
      ) : (
        <EmptyState
          title={searched ? "No work fits" : "Nothing here yet"}
          actions={
            mayUpload &&
            !searched && (
              <Link to="/scans/import" className="btn">
                Import scans
              </Link>
            )
          }
        >
          {searched
            ? "Change the search, or take a filter away."
            : "Files that take longer to read than a page should wait stand here, with how far they are and how they ended."}
        </EmptyState>
      )}
    </>
  );
}

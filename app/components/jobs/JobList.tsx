import { Form, Link } from "react-router";
import { fileSize } from "#app/lib/file-size.ts";
import { filesOf, pageOf } from "#app/lib/job-files.ts";
import type { JobRow } from "#app/schemas/job.ts";
import { JOB_WORDS } from "./job-words.ts";

/** Jobs, the newest first: how far each is, how it ended and, for whoever may, what can be done with it. */
export function JobList({ jobs }: { jobs: JobRow[] }) {
  return (
    <ul className="frame divide-y divide-line">
      {jobs.map((job) => (
        <li key={job.id} className="flex flex-wrap items-start justify-between gap-x-6 gap-y-2 p-3">
          <div className="min-w-0 max-w-160">
            <h2 className="font-semibold break-words">{job.title}</h2>
            <p className="text-label text-quiet">
              {job.program}, {job.createdAt.slice(0, 10)} {job.createdAt.slice(11, 16)} UTC, {job.createdBy}
            </p>
            <JobState job={job} />
            <FilesRefused job={job} />
          </div>
          {job.mayChange && <JobButton job={job} />}
        </li>
      ))}
    </ul>
  );
}

function JobState({ job }: { job: JobRow }) {
  const { state, sentence, done, total, title, stopAsked } = job;
  const page = pageOf(job.outcome);
  if (state === "running")
    return (
      <div className="mt-1 flex flex-wrap items-center gap-2">
        <progress className="w-32" value={done} max={total || 1} aria-label={`Reading ${title}`} />
        <span className="num">
          {fileSize(done)} of {fileSize(total)}
          {stopAsked && ", stopping"}
        </span>
      </div>
    );
  return (
    <p className={`mt-1 break-words ${state === "failed" ? "text-stop" : ""}`}>
      {JOB_WORDS[state]}
      {sentence && `. ${sentence}`}
      {page !== null && (
        <>
          {" "}
          <Link to={page} className="link">
            Open it<span className="sr-only">: {title}</span>
          </Link>
        </>
      )}
    </p>
  );
}

/** Of a job that is done, the files that stay as they are, each with its reason. */
function FilesRefused({ job: { outcome } }: { job: JobRow }) {
  const refused = filesOf(outcome).flatMap((file) => (file.outcome === "refused" ? file : []));
  if (refused.length === 0) return null;
  return (
    <ul className="mt-1 list-disc pl-5">
      {refused.map(({ file, reason }) => (
        <li key={file} className="break-words">
          {reason}
        </li>
      ))}
    </ul>
  );
}

function JobButton({ job: { id, state, title, stopAsked } }: { job: JobRow }) {
  const isUnderWay = state === "waiting" || state === "running";
  if (state === "done" || (isUnderWay && stopAsked)) return null;
  const intent = isUnderWay ? "stop" : "start";
  return (
    <Form method="post">
      <input type="hidden" name="job" value={id} />
      <button type="submit" name="intent" value={intent} className="btn">
        {intent === "stop" ? "Stop" : "Start again"}
        <span className="sr-only"> {title}</span>
      </button>
    </Form>
  );
}

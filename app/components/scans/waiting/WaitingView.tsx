import type { SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import type { Choice } from "#app/components/forms/ChoiceField.tsx";
import type { WaitingDetail } from "#app/schemas/waiting.ts";
import { HandPairForm } from "./HandPairForm.tsx";
import { MoveForm } from "./MoveForm.tsx";

export interface WaitingAnswers {
  pair: SubmissionResult<string[]> | null;
  move: SubmissionResult<string[]> | null;
}

interface Props {
  file: WaitingDetail;
  films: Choice[];
  mayUpload: boolean;
  answers: WaitingAnswers | null;
}

/** A file that waits: what it is, the partner to choose, where else it may belong, and the way out of the queue. */
export function WaitingView({ file, films, mayUpload, answers }: Props) {
  return (
    <div className="frame">
      <div className="p-4 tablet:px-6">
        <WaitingFacts file={file} />
      </div>
      {mayUpload && (
        <div className="grid border-t border-ink wide:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
          <section className="min-w-0 p-4 tablet:p-6" aria-labelledby="pair">
            <h2 id="pair" className="mb-2 font-semibold">
              Put together with its partner
            </h2>
            <HandPairForm file={file} films={films} lastResult={answers?.pair ?? null} />
          </section>
          <div className="min-w-0 border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l">
            <section aria-labelledby="elsewhere">
              <h2 id="elsewhere" className="mb-2 font-semibold">
                It belongs elsewhere
              </h2>
              <MoveForm file={file} lastResult={answers?.move ?? null} />
            </section>
            <details className="mt-6">
              <summary className="link w-fit cursor-pointer text-stop">Take it out of the queue</summary>
              <Form method="post" className="mt-2 flex flex-wrap items-center gap-4">
                <p>The import of {file.file.name} is undone. The file itself is kept and can be imported again.</p>
                <button type="submit" name="intent" value="remove" className="btn btn-remove">
                  Undo the import
                </button>
              </Form>
            </details>
          </div>
        </div>
      )}
    </div>
  );
}

function WaitingFacts({ file }: { file: WaitingDetail }) {
  const rows = [
    [
      "File",
      <a key="file" href={`/scans/files/${file.file.id}`} className="link wrap-anywhere">
        {file.file.name}
      </a>,
    ],
    ["Came in", `${file.createdAt.slice(0, 10)} ${file.createdAt.slice(11, 16)} UTC, by ${file.createdBy}`],
    ["Measured", file.measuredAt?.slice(0, 10) ?? "the file does not say"],
    ["Instrument", file.instrumentName || "not named"],
  ] as const;
  return (
    <dl className="grid gap-x-6 gap-y-2 tablet:grid-cols-2 wide:grid-cols-4">
      {rows.map(([name, value]) => (
        <div key={name} className="min-w-0">
          <dt className="text-label text-quiet">{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

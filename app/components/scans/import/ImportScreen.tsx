import type { SubmissionResult } from "@conform-to/react";
import { useCallback, useMemo, useState } from "react";
import { Link } from "react-router";
import type { Choice } from "#app/components/forms/ChoiceField.tsx";
import { LEAVE, UnsavedGuard } from "#app/components/forms/UnsavedGuard.tsx";
import { RunProgress } from "#app/components/ui/RunProgress.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { fileSize } from "#app/lib/file-size.ts";
import { MOST_FILES, type BatchFile } from "#app/lib/scan-import/batch.ts";
import { batchPlan } from "#app/lib/scan-import/plan.ts";
import { BatchForm } from "./BatchForm.tsx";
import { DropZone } from "./DropZone.tsx";
import { FileItem } from "./FileItem.tsx";
import type { KnownProfile } from "./FileProfile.tsx";
import { ImportList } from "./ImportList.tsx";
import { useBatch } from "./use-batch.ts";
import { useImport } from "./use-import.ts";

interface Props {
  programs: Choice[];
  films: Choice[];
  profiles: readonly KnownProfile[];
}

const FORM = "import-batch";

/** Import of many files at once: read here, asked about here, sent one by one. */
export function ImportScreen({ programs, films, profiles }: Props) {
  const { batch, change } = useBatch();
  const { files } = batch;
  const leave = useCallback((keys: string[]) => change({ kind: "remove", keys }), [change]);
  const { sending, results, refused, errors, finished, send } = useImport(leave);
  const add = useCallback((chosen: readonly File[]) => change({ kind: "add", files: chosen }), [change]);
  const plan = useMemo(() => batchPlan(files), [files]);
  const lastResult = useMemo(() => resultOf(errors), [errors]);
  const ready = plan.items.reduce((sum, item) => sum + item.files.length, 0);
  const begun = files.length > 0 || results.length > 0;
  const onlyTables = useOnlyTables(files);
  const counted = ready === 1 ? "1 file" : `${ready} files`;
  if (!useInBrowser())
    return (
      <p className="max-w-160">
        Files are read in the browser here, which takes scripts. Without them,{" "}
        <Link to="/scans/new" className="link">
          upload one pair
        </Link>{" "}
        by a form.
      </p>
    );
  return (
    <>
      <UnsavedGuard dirty={ready > 0 || sending !== null} />
      <DropZone onFiles={add} passedOver={batch.passedOver} most={MOST_FILES} />
      {begun && (
        <div className="frame mt-4">
          {files.length > 0 && (
            <section aria-labelledby="batch-files">
              <h2 id="batch-files" className="p-3 font-semibold tablet:px-6">
                {files.length === 1 ? "1 file" : `${files.length} files`}
              </h2>
              <ul className="border-t border-line">
                {files.map((file) => (
                  <FileItem key={file.key} file={file} known={profiles} others={files.length > 1} change={change} />
                ))}
              </ul>
            </section>
          )}
          <BatchForm
            id={FORM}
            programs={programs}
            films={films}
            onlyTables={onlyTables}
            begun={results.length > 0}
            lastResult={lastResult}
            onImport={(shared) => {
              if (sending === null && ready > 0) void send(plan.items, shared);
            }}
          />
          <section aria-labelledby="batch-import" className="border-t border-ink p-4 tablet:px-6">
            <h2 id="batch-import" className="mb-1 font-semibold">
              {ready === 0 && results.length > 0 ? "Imported" : `${counted} to import`}
            </h2>
            <ImportList plan={plan} results={results} refused={refused} sending={sending !== null} />
            <div className="mt-3 flex flex-wrap items-center gap-3">
              <button type="submit" form={FORM} className="btn btn-primary" disabled={sending !== null || ready === 0}>
                {sending !== null ? "Importing" : ready === 0 ? "Import" : `Import ${counted}`}
              </button>
              {sending !== null && <RunProgress done={sending.done} of={sending.of} label="Files imported" />}
              {sending?.reading && (
                <p className="text-quiet wrap-anywhere">
                  {`${sending.reading.name} is large: ${fileSize(sending.reading.read)} of ${fileSize(sending.reading.bytes)} read. It goes on when you leave, in the `}
                  <Link to="/jobs" state={LEAVE} className="link">
                    work under way
                  </Link>
                  .
                </p>
              )}
              <p role="status" className="text-quiet">
                {finished && outcomeWords(finished)}
              </p>
            </div>
          </section>
        </div>
      )}
    </>
  );
}

/**
 * Whether all that has been read is tables. Once a profile was there it stays so: what was typed for the profiles is not lost when the
 * last of them is in.
 */
function useOnlyTables(files: readonly BatchFile[]): boolean {
  const [profiled, setProfiled] = useState(false);
  const kinds = files.flatMap(({ told }) => told?.layout?.reading.kind ?? []);
  if (!profiled && kinds.includes("profiles")) setProfiled(true);
  return !profiled && kinds.length > 0;
}

function resultOf(errors: Record<string, string[]> | null): SubmissionResult<string[]> | null {
  if (errors === null) return null;
  const validated = Object.fromEntries(Object.keys(errors).map((field) => [field, true]));
  return { status: "error", error: errors, state: { validated } };
}

function outcomeWords({ kept, refused }: { kept: number; refused: number }): string {
  if (kept + refused === 0) return "Nothing was imported.";
  const left =
    refused === 0 ? "" : ` ${refused} refused, ${refused === 1 ? "its reason stands" : "their reasons stand"} above.`;
  return `${kept} imported.${left}`;
}

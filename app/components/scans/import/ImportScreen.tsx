import type { SubmissionResult } from "@conform-to/react";
import { useCallback, useMemo } from "react";
import { Link } from "react-router";
import type { Choice } from "#app/components/forms/ChoiceField.tsx";
import { UnsavedGuard } from "#app/components/forms/UnsavedGuard.tsx";
import { RunProgress } from "#app/components/ui/RunProgress.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { MOST_FILES } from "#app/lib/scan-import/batch.ts";
import { batchPairs } from "#app/lib/scan-import/pairs.ts";
import { BatchForm } from "./BatchForm.tsx";
import { DropZone } from "./DropZone.tsx";
import { FileItem } from "./FileItem.tsx";
import type { KnownProfile } from "./FileProfile.tsx";
import { PairList } from "./PairList.tsx";
import { useBatch } from "./use-batch.ts";
import { useImport } from "./use-import.ts";

interface Props {
  programs: Choice[];
  films: Choice[];
  profiles: readonly KnownProfile[];
}

const FORM = "import-batch";

/** Import of many files at once: read here, asked about here, sent as pairs. */
export function ImportScreen({ programs, films, profiles }: Props) {
  const { batch, change } = useBatch();
  const { files } = batch;
  const leave = useCallback((keys: string[]) => change({ kind: "remove", keys }), [change]);
  const { sending, kept, refused, errors, finished, send } = useImport(leave);
  const add = useCallback((chosen: readonly File[]) => change({ kind: "add", files: chosen }), [change]);
  const planned = useMemo(() => batchPairs(files), [files]);
  const lastResult = useMemo(() => resultOf(errors), [errors]);
  const { pairs } = planned;
  const begun = files.length > 0 || kept.length > 0;
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
      <UnsavedGuard dirty={pairs.length > 0 || sending !== null} />
      <DropZone onFiles={add} passedOver={batch.passedOver} most={MOST_FILES} />
      {begun && (
        <div className="frame mt-4">
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
          <BatchForm
            id={FORM}
            programs={programs}
            films={films}
            lastResult={lastResult}
            onImport={(shared) => {
              if (sending === null && pairs.length > 0) void send(pairs, shared);
            }}
          />
          <section aria-labelledby="batch-pairs" className="border-t border-ink p-4 tablet:px-6">
            <h2 id="batch-pairs" className="mb-1 font-semibold">
              {pairs.length === 1 ? "1 pair to import" : `${pairs.length} pairs to import`}
            </h2>
            <PairList planned={planned} kept={kept} refused={refused} />
            <div className="mt-3 flex flex-wrap items-center gap-3">
              <button
                type="submit"
                form={FORM}
                className="btn btn-primary"
                disabled={sending !== null || pairs.length === 0}
              >
                {sending !== null ? "Importing" : pairs.length === 1 ? "Import 1 pair" : `Import ${pairs.length} pairs`}
              </button>
              {sending !== null && <RunProgress done={sending.done} of={sending.of} label="Pairs imported" />}
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

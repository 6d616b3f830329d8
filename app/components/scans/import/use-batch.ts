import { useEffect, useReducer, useRef } from "react";
import { changedBatch, EMPTY_BATCH } from "#app/lib/scan-import/batch.ts";
import { unreadable, type FileAsked, type FileSaid } from "#app/lib/scan-import/told.ts";

const BROKEN = "This browser could not start reading. Reload the page, or upload the pair by the form.";

/** The files of a batch. Each is read in a worker when it comes and whenever its profile changes; nothing is sent. */
export function useBatch() {
  const [batch, change] = useReducer(changedBatch, EMPTY_BATCH);
  const worker = useRef<Worker | null>(null);
  const asked = useRef(new Map<string, number>());

  useEffect(() => {
    const known = asked.current;
    return () => {
      worker.current?.terminate();
      worker.current = null;
      known.clear();
    };
  }, []);

  useEffect(() => {
    const waiting = batch.files.filter(
      ({ key, revision, done }) => done !== null && asked.current.get(key) !== revision,
    );
    if (waiting.length === 0) return;
    if (worker.current === null) {
      const made = new Worker(new URL("../../../lib/scan-import/file-worker.ts", import.meta.url), { type: "module" });
      made.onmessage = ({ data }: MessageEvent<FileSaid>) => change({ kind: "said", said: data });
      made.onerror = () => {
        for (const [key, revision] of asked.current)
          change({ kind: "said", said: { key, revision, kind: "told", told: unreadable(BROKEN) } });
      };
      worker.current = made;
    }
    for (const { key, revision, file, profile } of waiting) {
      asked.current.set(key, revision);
      worker.current.postMessage({ key, revision, file, profile } satisfies FileAsked);
    }
  }, [batch.files]);

  return { batch, change };
}

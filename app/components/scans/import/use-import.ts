import { useState } from "react";
import type { BatchFile } from "#app/lib/scan-import/batch.ts";
import { missingOfPairs, type PlannedItem } from "#app/lib/scan-import/plan.ts";
import { sendFile } from "#app/lib/scan-import/send-file.ts";
import { addedResults, type ImportResult } from "#app/lib/scan-import/results.ts";
import type { FileAnswer } from "#app/schemas/scan-import.ts";

type FieldErrors = Extract<FileAnswer, { outcome: "fields" }>["errors"];

/** Why a file was not taken, by how it was read and placed: a change of either takes the reason away. */
export const refusalKey = ({ key, revision, of, azimuths }: BatchFile) =>
  `${key} ${revision} ${JSON.stringify([of, azimuths])}`;

interface Sending {
  done: number;
  of: number;
  /** a large file that the server is reading, bytes */
  reading?: { name: string; read: number; bytes: number };
}

/** Sends the files of a batch one after the other and keeps what came of each. */
export function useImport(leave: (keys: string[]) => void) {
  const [sending, setSending] = useState<Sending | null>(null);
  const [results, setResults] = useState<readonly ImportResult[]>([]);
  const [refused, setRefused] = useState<ReadonlyMap<string, string>>(new Map());
  const [errors, setErrors] = useState<FieldErrors | null>(null);
  const [finished, setFinished] = useState<{ kept: number; refused: number } | null>(null);

  const send = async (items: readonly PlannedItem[], shared: FormData) => {
    const missing = missingOfPairs(items, shared);
    setErrors(missing);
    setFinished(null);
    setRefused(new Map());
    if (missing) return;
    const files = items.flatMap((item) => item.files);
    const outcome = { kept: 0, refused: 0 };
    for (const [n, file] of files.entries()) {
      setSending({ done: n, of: files.length });
      const answer = await sendFile(file, shared, (read, bytes) =>
        setSending({ done: n, of: files.length, reading: { name: file.file.name, read, bytes } }),
      );
      if (answer.outcome === "fields") {
        setErrors(answer.errors);
        break;
      }
      if (answer.outcome === "refused") {
        outcome.refused += 1;
        setRefused((known) => new Map(known).set(refusalKey(file), answer.reason));
        continue;
      }
      outcome.kept += 1;
      setResults((known) => addedResults(known, { file: file.file.name, key: file.key }, answer));
      leave([file.key]);
    }
    setSending(null);
    setFinished(outcome);
  };
  return { sending, results, refused, errors, finished, send };
}

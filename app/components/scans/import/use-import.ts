import { useState } from "react";
import type { FilePair } from "#app/lib/scan-import/pairs.ts";
import { sendPair } from "#app/lib/scan-import/send-pair.ts";
import type { PairAnswer } from "#app/schemas/scan-import.ts";

/** A pair that is in: the files that made it, by name. */
export interface KeptPair {
  id: string;
  label: string;
  files: [before: string, after: string];
  /** it was in already */
  already: boolean;
}

type FieldErrors = Extract<PairAnswer, { outcome: "fields" }>["errors"];

/** Why a pair was not taken, by its files and how they were read: a change of either takes the reason away. */
export const pairKey = ({ before, after }: FilePair) =>
  `${before.key} ${before.revision} ${after.key} ${after.revision}`;

/** Sends the pairs of a batch one after the other and keeps what came of each. */
export function useImport(leave: (keys: string[]) => void) {
  const [sending, setSending] = useState<{ done: number; of: number } | null>(null);
  const [kept, setKept] = useState<KeptPair[]>([]);
  const [refused, setRefused] = useState<ReadonlyMap<string, string>>(new Map());
  const [errors, setErrors] = useState<FieldErrors | null>(null);
  const [finished, setFinished] = useState<{ kept: number; refused: number } | null>(null);

  const send = async (pairs: readonly FilePair[], shared: FormData) => {
    setErrors(null);
    setFinished(null);
    setRefused(new Map());
    const outcome = { kept: 0, refused: 0 };
    for (const [n, pair] of pairs.entries()) {
      setSending({ done: n, of: pairs.length });
      const answer = await sendPair(pair, shared);
      if (answer.outcome === "fields") {
        setErrors(answer.errors);
        break;
      }
      if (answer.outcome === "refused") {
        outcome.refused += 1;
        const { which, reason } = answer;
        setRefused((known) => new Map(known).set(pairKey(pair), withFile(pair, which, reason)));
        continue;
      }
      outcome.kept += 1;
      const { before, after, label } = pair;
      setKept((known) => [
        ...known,
        { id: answer.id, label, files: [before.file.name, after.file.name], already: answer.outcome === "already" },
      ]);
      leave([before.key, after.key]);
    }
    setSending(null);
    setFinished(outcome);
  };
  return { sending, kept, refused, errors, finished, send };
}

/** The reason, with the file where it does not name it. */
function withFile(pair: FilePair, which: "before" | "after" | null, reason: string): string {
  if (which === null || reason.includes(pair[which].file.name)) return reason;
  return `File ${which} the film: ${reason}`;
}

import type { FieldMetadata } from "@conform-to/react";
import { useState } from "react";
import { fileSize } from "#app/lib/file-size.ts";
import { MOST_REPEAT_FILES, REPEAT_FILE } from "#app/lib/repeat-files.ts";

/** Several files to choose or to drop on the field. What cannot be taken is said as soon as they are chosen. */
export function RepeatFiles({ field, again }: { field: FieldMetadata<string | undefined>; again: boolean }) {
  const [chosen, setChosen] = useState<{ words: string; fault: boolean } | null>(null);
  // What the server said is about what was sent: it goes when others are chosen, until the server has said something again.
  const [answered, setAnswered] = useState<string[]>();
  const error = field.errors === answered ? undefined : field.errors?.[0];
  const fault = error ?? (chosen?.fault ? chosen.words : undefined);
  const hint =
    chosen?.words ?? (again ? "Choose the files again." : "CSV or text; choose them all at once, or drop them here");
  return (
    <div className="field">
      <label htmlFor={field.id}>Files of the repeats</label>
      <input
        type="file"
        multiple
        id={field.id}
        name={field.name}
        accept=".csv,.txt,.dat,.tsv,text/csv,text/plain"
        aria-invalid={fault ? true : undefined}
        aria-describedby={field.errorId}
        className="file:mr-3 file:cursor-pointer file:border-0 file:bg-transparent file:font-medium file:text-ink file:underline max-tablet:file:leading-8"
        onChange={(event) => {
          setChosen(said([...(event.currentTarget.files ?? [])]));
          setAnswered(field.errors);
        }}
      />
      <small id={field.errorId} aria-live="polite">
        {fault ?? hint}
      </small>
    </div>
  );
}

function said(files: File[]): { words: string; fault: boolean } | null {
  if (files.length === 0) return null;
  const large = files.find(({ size }) => size > REPEAT_FILE.bytes);
  if (large)
    return {
      words: `${large.name} has ${fileSize(large.size)}; a file may have up to ${REPEAT_FILE.words}.`,
      fault: true,
    };
  if (files.length > MOST_REPEAT_FILES)
    return { words: `${files.length} files are more than a study takes, ${MOST_REPEAT_FILES}.`, fault: true };
  return { words: files.length === 1 ? "1 file chosen" : `${files.length} files chosen`, fault: false };
}

import type { FieldMetadata } from "@conform-to/react";
import { useState } from "react";
import { fileSize } from "#app/lib/file-size.ts";
import { LARGEST_FILE, LARGEST_FILE_WORDS, tooLargeSentence } from "#app/lib/scan-file.ts";

interface Props {
  field: FieldMetadata<string | undefined>;
  label: string;
  /** the form came back, so the browser has let go of the file */
  again: boolean;
  /** tells whether a file is chosen now */
  onChosen: (chosen: boolean) => void;
}

/** A file to choose. One that is too large is turned down as soon as it is chosen. */
export function FileField({ field, label, again, onChosen }: Props) {
  const [chosen, setChosen] = useState<{ words: string; tooLarge: boolean } | null>(null);
  const fault = chosen === null ? field.errors?.[0] : chosen.tooLarge ? chosen.words : undefined;
  const hint = chosen?.words ?? (again ? "Choose the file again." : `CSV or text, up to ${LARGEST_FILE_WORDS}`);
  return (
    <div className="field">
      <label htmlFor={field.id}>{label}</label>
      <input
        type="file"
        id={field.id}
        name={field.name}
        accept=".csv,.txt,.dat,.tsv,text/csv,text/plain"
        aria-invalid={fault ? true : undefined}
        aria-describedby={field.errorId}
        className="file:mr-3 file:cursor-pointer file:border-0 file:bg-transparent file:font-medium file:text-ink file:underline max-tablet:file:leading-8"
        onChange={(event) => {
          const input = event.currentTarget;
          const file = input.files?.[0];
          const tooLarge = file !== undefined && file.size > LARGEST_FILE;
          onChosen(file !== undefined && !tooLarge);
          if (!file) return setChosen(null);
          // Taken back at once, lest a long upload end in a refusal.
          if (tooLarge) input.value = "";
          setChosen({ words: tooLarge ? tooLargeSentence(file.name, file.size) : fileSize(file.size), tooLarge });
        }}
      />
      <small id={field.errorId} aria-live="polite">
        {fault ?? hint}
      </small>
    </div>
  );
}

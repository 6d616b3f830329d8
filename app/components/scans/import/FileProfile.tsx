import { useEffect, useId, useRef, useState } from "react";
import { useFetcher } from "react-router";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { keptProfile } from "#app/lib/scan-import/answers.ts";
import type { BatchFile } from "#app/lib/scan-import/batch.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { KeptAnswer } from "#app/schemas/scan-import.ts";

/** A profile of the site, to use. */
export interface KnownProfile {
  id: string;
  name: string;
  profile: ImportProfile;
}

interface Props {
  file: BatchFile;
  known: readonly KnownProfile[];
  /** whether there are other files to apply it to */
  others: boolean;
  onInstrument: (chosen: KnownProfile | null) => void;
  /** a profile was kept for the instrument, under this id */
  onKept: (instrument: string) => void;
  onProfileOfAll: () => void;
}

/** Takes what was answered to the other files, keeps it for the instrument, or takes what was kept. */
export function FileProfile({ file, known, others, onInstrument, onKept, onProfileOfAll }: Props) {
  const reading = file.told?.layout?.reading ?? null;
  const answered = Object.keys(file.profile).length > 0;
  const [applied, setApplied] = useState(false);
  return (
    <div className="grid items-start gap-x-6 gap-y-2 wide:grid-cols-3">
      <SelectField
        name="use"
        label="Use profile of an instrument"
        hint={file.instrument === null ? undefined : "Its name stays on the scan"}
        blank={known.length === 0 ? "None is kept yet" : "Choose"}
        options={known.map(({ id, name }) => ({ value: id, label: name }))}
        disabled={known.length === 0}
        value={file.instrument ?? ""}
        onChange={({ currentTarget: { value } }) => onInstrument(known.find(({ id }) => id === value) ?? null)}
      />
      {reading !== null && file.told?.outcome === "read" && (
        <KeepProfile profile={keptProfile(reading, file.profile)} onKept={onKept} />
      )}
      {others && (answered || file.instrument !== null) && (
        <div className="wide:pt-5">
          <button
            type="button"
            className="btn"
            onClick={() => {
              onProfileOfAll();
              setApplied(true);
            }}
          >
            Apply to all files of this batch
          </button>
          <p role="status" className="mt-1 text-label text-quiet">
            {applied ? "Applied. A file that contradicts it says so." : "What was chosen here, not what the file says."}
          </p>
        </div>
      )}
    </div>
  );
}

function KeepProfile({ profile, onKept }: { profile: ImportProfile } & Pick<Props, "onKept">) {
  const id = useId();
  const fetcher = useFetcher<KeptAnswer>();
  const [name, setName] = useState("");
  const busy = fetcher.state !== "idle";
  const fault = busy ? undefined : fetcher.data?.fault;
  const kept = busy ? undefined : fetcher.data?.kept;
  const told = useRef<string>(undefined);
  useEffect(() => {
    if (!kept || told.current === kept.id) return;
    told.current = kept.id;
    onKept(kept.id);
  }, [kept, onKept]);
  return (
    <div className="field">
      <label htmlFor={id}>Keep for this instrument, under its name</label>
      <div className="flex gap-2">
        <input
          id={id}
          value={name}
          maxLength={80}
          autoComplete="off"
          aria-invalid={fault ? true : undefined}
          aria-describedby={`${id}-note`}
          onChange={({ currentTarget: { value } }) => setName(value)}
        />
        <button
          type="button"
          className="btn"
          disabled={busy}
          onClick={() => {
            void fetcher.submit({ name, profile: JSON.stringify(profile) }, { method: "post" });
          }}
        >
          {busy ? "Keeping" : "Keep"}
        </button>
      </div>
      <small id={`${id}-note`} aria-live="polite">
        {fault ?? (kept ? `Kept as ${kept.name}` : "For its next files")}
      </small>
    </div>
  );
}

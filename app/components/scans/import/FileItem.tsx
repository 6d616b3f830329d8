import { useId, useRef, useState } from "react";
import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { count } from "#app/components/ui/RunProgress.tsx";
import { fileSize } from "#app/lib/file-size.ts";
import type { BatchChange, BatchFile } from "#app/lib/scan-import/batch.ts";
import { guessFromName } from "#app/lib/scan-import/name-guess.ts";
import { kindOf, linesOf, lineWords, waferWords } from "#app/lib/scan-import/place-words.ts";
import type { Told } from "#app/lib/scan-import/told.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { FileColumns } from "./FileColumns.tsx";
import { FileFaults } from "./FileFaults.tsx";
import { FileLayout } from "./FileLayout.tsx";
import { FilePlace } from "./FilePlace.tsx";
import { FileProfile, type KnownProfile } from "./FileProfile.tsx";
import { FileQuestions } from "./FileQuestions.tsx";
import { FileTrace } from "./FileTrace.tsx";

interface Props {
  file: BatchFile;
  known: readonly KnownProfile[];
  others: boolean;
  change: (change: BatchChange) => void;
}

/** Plots that are drawn of a file of many profiles. */
const MOST_TRACES = 6;

/** One file of a batch: how it stands in a line, and below it, unfolded, all that is known of it and can be changed. */
export function FileItem({ file, known, others, change }: Props) {
  const { key, file: raw, told } = file;
  const bodyId = useId();
  const heading = useRef<HTMLButtonElement>(null);
  // A question unfolds its file; from then on folding is left to the person.
  const [unfolded, setUnfolded] = useState<boolean | null>(null);
  const open = unfolded ?? told?.outcome === "question";
  const placed = placeWords(file);
  return (
    <li className="border-t border-line py-2 first:border-0">
      <h3>
        <button
          ref={heading}
          type="button"
          aria-expanded={open}
          aria-controls={open ? bodyId : undefined}
          className="flex w-full cursor-pointer gap-3 px-3 py-1 text-left hover:bg-wash tablet:px-6"
          onClick={() => setUnfolded(!open)}
        >
          <Fold open={open} />
          <span className="min-w-0">
            <span className="font-semibold wrap-anywhere">{raw.name}</span>{" "}
            <span className="text-quiet">
              {fileSize(raw.size)}
              {placed === "" ? "" : `; ${placed}`}
            </span>
          </span>
        </button>
      </h3>
      <div className="flex flex-wrap items-start justify-between gap-x-4 gap-y-2 px-3 py-1 tablet:px-6">
        <FileState file={file} />
        <button
          type="button"
          className="link min-h-6"
          aria-label={`Take ${raw.name} out of the batch`}
          onClick={() => change({ kind: "remove", keys: [key] })}
        >
          Take out
        </button>
      </div>
      {open && (
        <FileBody
          {...{ id: bodyId, file, known, others, change }}
          onChanged={() => setUnfolded(true)}
          // The question goes with its answer, and the focus would go with it.
          onAnswered={() => heading.current?.focus()}
        />
      )}
    </li>
  );
}

/** A triangle that points to what is folded, or down to what is not. */
function Fold({ open }: { open: boolean }) {
  return (
    <svg viewBox="0 0 10 10" className="mt-1.5 h-2.5 w-[22px] flex-none" aria-hidden="true">
      <path d={open ? "M0 2H10L5 9Z" : "M2 0V10L9 5Z"} fill="currentColor" />
    </svg>
  );
}

/** What a file is of, as far as that is known: of a table its kind. */
function placeWords(file: BatchFile): string {
  const kind = kindOf(file);
  if (kind !== "profiles") return kind;
  const { of } = file;
  const line = waferWords(of) === "" ? [] : [linesOf(file).length > 1 ? waferWords(of) : lineWords(of)];
  return [...line, ...(of.side === "" ? [] : [`${of.side} the film`])].join(", ");
}

/** How a file stands: being read, read, asked about or refused. */
function FileState({ file: { file, done, told } }: { file: BatchFile }) {
  if (done !== null || told === null)
    return (
      <span className="flex items-center gap-2 text-quiet">
        <progress className="w-32" value={done ?? 0} max={file.size || 1} aria-label={`Reading ${file.name}`} />
        Reading
      </span>
    );
  const level = told.outcome === "read" ? "clear" : told.outcome === "question" ? "caution" : "stop";
  return (
    <p role="status" className="flex min-w-0 gap-3">
      <span className="mt-0.5 w-[22px] flex-none">
        <Swatch level={level} />
      </span>
      <span className="min-w-0 wrap-anywhere">{wordsOf(told)}</span>
    </p>
  );
}

function wordsOf({ outcome, sentence, rows, faults, layout }: Told): string {
  if (outcome === "refused") return sentence ?? "";
  const asked = layout?.reading.ambiguities.filter(({ blocks }) => blocks).length ?? 0;
  if (outcome === "question") return asked === 1 ? "One question is open." : `${asked} questions are open.`;
  const faulty = faults.reduce((sum, fault) => sum + fault.count, 0);
  const left = faulty === 0 ? "" : `, ${count(faulty)} ${faulty === 1 ? "fault" : "faults"}`;
  return `Read: ${count(rows)} rows${left}.`;
}

interface BodyProps extends Props {
  id: string;
  /** the file is read anew: it stays unfolded, also when its last question is answered */
  onChanged: () => void;
  onAnswered: () => void;
}

function FileBody({ id, file, known, others, change, onChanged, onAnswered }: BodyProps) {
  const { key, told, profile } = file;
  const { name } = file.file;
  const onProfile = (next: ImportProfile) => {
    onChanged();
    change({ kind: "profile", key, profile: next });
  };
  const layout = told?.layout ?? null;
  const profiles = told?.profiles ?? [];
  return (
    <div id={id} className="grid gap-4 px-3 pt-2 pb-3 tablet:px-6">
      {layout && (
        <FileQuestions
          {...{ name, profile }}
          reading={layout.reading}
          onProfile={(next) => {
            onProfile(next);
            onAnswered();
          }}
        />
      )}
      <FilePlace
        file={file}
        kind={kindOf(file)}
        proposed={guessFromName(name)}
        onOf={(next) => change({ kind: "of", key, of: next })}
        onAzimuth={(profile, azimuth) => change({ kind: "azimuth", key, profile, azimuth })}
      />
      <FileLayout reading={layout?.reading ?? null} profile={profile} onProfile={onProfile} />
      <div className="grid items-start gap-x-6 gap-y-4 wide:grid-cols-[minmax(0,1fr)_22rem]">
        {layout && (
          <FileColumns
            {...{ name, layout, profile, onProfile }}
            faulty={told?.faults.flatMap(({ places }) => places) ?? []}
          />
        )}
        <div className="grid min-w-0 gap-3">
          {profiles.slice(0, MOST_TRACES).map((each, n) => (
            <FileTrace key={n} profile={each} />
          ))}
          {profiles.length > MOST_TRACES && (
            <p className="text-quiet">{`and ${profiles.length - MOST_TRACES} more profiles`}</p>
          )}
          {told && <FileFaults faults={told.faults} footerLines={told.footerLines} />}
        </div>
      </div>
      <FileProfile
        {...{ file, known, others }}
        onInstrument={(chosen) => {
          onChanged();
          change({ kind: "instrument", key, instrument: chosen?.id ?? null, profile: chosen?.profile ?? {} });
        }}
        onKept={(instrument) => change({ kind: "instrument", key, instrument })}
        onProfileOfAll={() => change({ kind: "profile of all", from: key })}
      />
    </div>
  );
}

import { useEffect, useId, useState } from "react";
import { LARGEST_FILE_WORDS } from "#app/lib/scan-file.ts";

interface Props {
  onFiles: (files: readonly File[]) => void;
  /** files of the last choice that were not taken up */
  passedOver: { twice: number; tooMany: number };
  most: number;
}

/** Takes files that are dropped anywhere on the page, or chosen. */
export function DropZone({ onFiles, passedOver, most }: Props) {
  const id = useId();
  const over = useDrop(onFiles);
  const said = [
    ...(passedOver.twice > 0 ? [`${counted(passedOver.twice)} in the batch already.`] : []),
    ...(passedOver.tooMany > 0
      ? [`${counted(passedOver.tooMany)} left out: a batch has up to ${most} files. Import these first.`]
      : []),
  ];
  return (
    <div className={`empty field ${over ? "border-solid! border-ink! bg-wash" : ""}`}>
      <p className="text-lead font-semibold" aria-hidden={over || undefined}>
        {over ? "Let go to read the files here" : "Drop the files of the instrument here"}
      </p>
      <p className="mb-3 max-w-160 text-quiet">
        Scans, summaries of lots, thickness maps: as many as there are. They are read in this browser; nothing is sent
        before you import.
      </p>
      <label htmlFor={id}>Or choose files</label>
      <input
        type="file"
        id={id}
        multiple
        accept=".csv,.txt,.dat,.tsv,.asc,.prn,text/csv,text/plain"
        aria-describedby={`${id}-note`}
        className="max-w-120 file:mr-3 file:cursor-pointer file:border-0 file:bg-transparent file:font-medium file:text-ink file:underline max-tablet:file:leading-8"
        onChange={({ currentTarget }) => {
          onFiles([...(currentTarget.files ?? [])]);
          // The same file can be chosen again after it was put right.
          currentTarget.value = "";
        }}
      />
      <small id={`${id}-note`} aria-live="polite">
        {said.length > 0 ? said.join(" ") : `CSV or text, up to ${LARGEST_FILE_WORDS} each`}
      </small>
    </div>
  );
}

const counted = (files: number) => (files === 1 ? "1 file is" : `${files} files are`);

/** Whether files hang over the page; what is dropped beside the zone would else replace the page. */
function useDrop(onFiles: Props["onFiles"]): boolean {
  const [over, setOver] = useState(false);
  useEffect(() => {
    const holdsFiles = ({ dataTransfer }: DragEvent) => dataTransfer?.types.includes("Files") ?? false;
    const hang = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      event.preventDefault();
      setOver(true);
    };
    const leave = (event: DragEvent) => {
      if (event.relatedTarget === null) setOver(false);
    };
    const drop = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      event.preventDefault();
      setOver(false);
      onFiles([...(event.dataTransfer?.files ?? [])]);
    };
    window.addEventListener("dragover", hang);
    window.addEventListener("dragleave", leave);
    window.addEventListener("drop", drop);
    return () => {
      window.removeEventListener("dragover", hang);
      window.removeEventListener("dragleave", leave);
      window.removeEventListener("drop", drop);
    };
  }, [onFiles]);
  return over;
}

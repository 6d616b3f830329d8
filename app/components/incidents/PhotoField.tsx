import { useState } from "react";
import { fileSize } from "#app/lib/file-size.ts";
import { MOST_PHOTOS, PHOTO_LIMIT } from "#app/schemas/incident-photo.ts";

interface Props {
  id: string;
  faults: readonly string[];
  /** the form came back, so the browser has let go of what was chosen */
  again: boolean;
}

const HINT = `JPEG or PNG, up to ${MOST_PHOTOS}, each up to ${PHOTO_LIMIT.words}. Where and by whose camera they were taken is thrown away.`;

/** Photos to choose, several at once; a phone offers its camera. */
export function PhotoField({ id, faults, again }: Props) {
  const [chosen, setChosen] = useState<string | null>(null);
  const found = chosen === null ? faults : [];
  return (
    <div className="field">
      <label htmlFor={id}>Photos</label>
      <input
        type="file"
        id={id}
        name="photos"
        multiple
        accept="image/jpeg,image/png"
        aria-invalid={found.length > 0 ? true : undefined}
        aria-describedby={`${id}-hint`}
        className="file:mr-3 file:cursor-pointer file:border-0 file:bg-transparent file:font-medium file:text-ink file:underline max-tablet:file:leading-8"
        onChange={({ currentTarget: { files } }) => {
          const sizes = [...(files ?? [])].map(({ size }) => size);
          const count = sizes.length === 1 ? "1 photo" : `${sizes.length} photos`;
          setChosen(
            sizes.length === 0 ? null : `${count}, ${fileSize(sizes.reduce((sum, size) => sum + size, 0))}. ${HINT}`,
          );
        }}
      />
      <small id={`${id}-hint`} aria-live="polite">
        {found.map((fault) => (
          <span key={fault} className="block">
            {fault}
          </span>
        ))}
        {found.length === 0 && (chosen ?? (again ? `Choose the photos again, if you had any. ${HINT}` : HINT))}
      </small>
    </div>
  );
}

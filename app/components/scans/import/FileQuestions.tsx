import { useId, useState } from "react";
import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { answersTo } from "#app/lib/scan-import/answers.ts";
import type { Ambiguity, Reading } from "#app/lib/scan-reading/reading.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";

interface Props {
  name: string;
  reading: Reading;
  profile: ImportProfile;
  onProfile: (profile: ImportProfile) => void;
}

/** Everything that a file leaves open, each with its answers to choose. The file is read anew with the first press. */
export function FileQuestions({ name, reading, profile, onProfile }: Props) {
  if (reading.ambiguities.length === 0) return null;
  return (
    <ul aria-label={`Open questions of ${name}`}>
      {reading.ambiguities.map((open) => (
        <Question key={`${open.what} ${open.column}`} {...{ open, reading, profile, onProfile }} />
      ))}
    </ul>
  );
}

function Question({ open, reading, profile, onProfile }: Omit<Props, "name"> & { open: Ambiguity }) {
  const id = useId();
  const answers = answersTo(open, reading, profile);
  return (
    <li className="flex gap-3 border-t border-line py-2 first:border-0">
      <span className="mt-0.5 w-[22px] flex-none">{open.blocks && <Swatch level="caution" />}</span>
      <div>
        <p id={id}>
          <b className={open.blocks ? "text-caution" : ""}>{open.blocks ? "Question. " : "Open. "}</b>
          {capital(open.sentence)}
          {open.what === "columns" && " Choose the roles in the table of columns below."}
          {open.what === "kind" && " Choose the kind of file below."}
        </p>
        {answers.length > 0 && (
          <div role="group" aria-labelledby={id} className="mt-2 flex flex-wrap gap-2">
            {answers.map((answer) => (
              <button key={answer.label} type="button" className="btn" onClick={() => onProfile(answer.profile)}>
                {answer.label}
              </button>
            ))}
          </div>
        )}
        {open.what === "how measured" && <HowMeasured onMeasured={(measured) => onProfile({ ...profile, measured })} />}
      </div>
    </li>
  );
}

type Measured = NonNullable<ImportProfile["measured"]>;

const MEASURED = [
  { key: "sideUp", label: "Side up", values: ["device", "back"] },
  { key: "support", label: "Lay on", values: ["three points", "ring", "table", "centre"] },
  { key: "gravity", label: "Gravity", values: ["compensated", "included"] },
] as const;

/** Three answers that count together. */
function HowMeasured({ onMeasured }: { onMeasured: (measured: Measured) => void }) {
  const [chosen, setChosen] = useState<Partial<Measured>>({});
  const choose = (next: Partial<Measured>) => {
    setChosen(next);
    const { sideUp, support, gravity } = next;
    if (sideUp && support && gravity) onMeasured({ sideUp, support, gravity });
  };
  return (
    <div className="mt-2 grid gap-x-3 tablet:grid-cols-3">
      {MEASURED.map(({ key, label, values }) => (
        <SelectField
          key={key}
          name={key}
          label={label}
          blank="Choose"
          options={values.map((value) => ({ value, label: value }))}
          value={chosen[key] ?? ""}
          onChange={({ currentTarget: { value } }) => choose({ ...chosen, [key]: value || undefined })}
        />
      ))}
    </div>
  );
}

const capital = (sentence: string) => sentence.charAt(0).toUpperCase() + sentence.slice(1);

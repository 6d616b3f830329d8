import { SelectField, type Option } from "#app/components/ui/SelectField.tsx";
import { without } from "#app/lib/scan-import/answers.ts";
import {
  DECIMAL_MARKS,
  DELIMITERS,
  ENCODINGS,
  FILE_KINDS,
  THOUSANDS,
  type Reading,
} from "#app/lib/scan-reading/reading.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { DELIMITER_WORDS } from "#app/lib/scan-reading/delimiter-words.ts";

interface Props {
  reading: Reading | null;
  profile: ImportProfile;
  onProfile: (profile: ImportProfile) => void;
}

const plain = (words: readonly string[]): Option[] => words.map((word) => ({ value: word, label: word }));
const delimiters = DELIMITERS.map((sign) => ({ value: sign, label: DELIMITER_WORDS[sign] ?? sign }));

const CHOICES = [
  { key: "kind", label: "Kind of file", options: plain(FILE_KINDS) },
  { key: "delimiter", label: "Between columns", options: delimiters },
  { key: "decimalMark", label: "Decimal mark", options: plain(DECIMAL_MARKS) },
  { key: "thousands", label: "Thousands grouped by", options: plain(THOUSANDS) },
  { key: "encoding", label: "Encoding", options: plain(ENCODINGS) },
] as const;

/** How a file was understood as a whole: what it says by itself stands first, and is changed by choosing. */
export function FileLayout({ reading, profile, onProfile }: Props) {
  return (
    <div className="grid grid-cols-2 gap-x-3 gap-y-1 tablet:grid-cols-3 wide:grid-cols-5">
      {CHOICES.map(({ key, label, options }) => {
        const stated = profile[key];
        const found = reading?.[key] ?? null;
        const word = options.find(({ value }) => value === found)?.label ?? found;
        return (
          <SelectField
            key={key}
            name={key}
            label={label}
            options={options}
            blank={stated === undefined && word !== null ? word : "As the file says"}
            hint={stated === undefined ? (word === null ? "Not told" : "Told by the file") : "Chosen"}
            value={stated ?? ""}
            onChange={({ currentTarget: { value } }) =>
              onProfile(value === "" ? without(profile, key) : ({ ...profile, [key]: value } as ImportProfile))
            }
          />
        );
      })}
    </div>
  );
}

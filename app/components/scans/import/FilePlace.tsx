import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { excerpt } from "#app/lib/excerpt.ts";
import type { ScanOf } from "#app/lib/scan-import/name-guess.ts";
import { azimuthOf, linesOf } from "#app/lib/scan-import/place-words.ts";
import type { BatchFile } from "#app/lib/scan-import/batch.ts";
import type { FileKind } from "#app/lib/scan-reading/reading.ts";

interface Props {
  file: BatchFile;
  kind: FileKind;
  /** what the name of the file proposes */
  proposed: ScanOf;
  onOf: (of: Partial<ScanOf>) => void;
  onAzimuth: (profile: number, azimuth: string) => void;
}

const SIDES = [
  { value: "before", label: "before the film" },
  { value: "after", label: "after the film" },
];

/**
 * What a file is of. What the file's name proposes stands there to be looked at. A table says itself of which wafers it is; what stands
 * here is for rows that do not.
 */
export function FilePlace({ file, kind, proposed, onOf, onAzimuth }: Props) {
  const { of } = file;
  const lines = linesOf(file);
  const isTable = kind !== "profiles";
  const hint = (field: keyof ScanOf) =>
    of[field] !== "" && of[field] === proposed[field] ? "Proposed by the file’s name" : undefined;
  const line = (field: Exclude<keyof ScanOf, "side">) => ({
    name: field,
    value: of[field],
    maxLength: 60,
    hint: hint(field),
    onChange: ({ currentTarget: { value } }: { currentTarget: { value: string } }) => onOf({ [field]: value }),
  });
  const unnamed = of.wafer.trim() === "" && (of.lot.trim() === "" || of.slot.trim() === "");
  const otherwise = (field: keyof ScanOf) => (isTable ? "Where a row names none" : hint(field));
  return (
    <div className="grid grid-cols-2 gap-x-3 gap-y-1 tablet:grid-cols-3 wide:grid-cols-5">
      {kind !== "summary" && (
        <TextField
          label="Wafer"
          {...line("wafer")}
          hint={otherwise("wafer")}
          error={unnamed && !isTable ? "Name the wafer, or its lot and slot" : undefined}
        />
      )}
      <TextField label="Lot" {...line("lot")} hint={otherwise("lot")} />
      {kind !== "summary" && <TextField label="Slot" inputMode="numeric" {...line("slot")} hint={otherwise("slot")} />}
      {!isTable && lines.length < 2 && (
        <TextField
          label="Azimuth from the notch, °"
          inputMode="decimal"
          {...line("azimuth")}
          hint={of.azimuth.trim() === "" ? "Blank: 0°" : hint("azimuth")}
          error={azimuthOf(of) === null ? NO_ANGLE : undefined}
        />
      )}
      {!isTable && (
        <SelectField
          label="Before or after the film"
          name="side"
          options={SIDES}
          blank="Choose"
          value={of.side}
          hint={hint("side")}
          onChange={({ currentTarget: { value } }) => onOf({ side: value as ScanOf["side"] })}
        />
      )}
      {!isTable &&
        lines.length > 1 &&
        lines.map(({ profile, name, azimuth }) => (
          <TextField
            key={profile}
            name={`azimuth-${profile}`}
            label={`Azimuth of “${excerpt(name, 24)}”, °`}
            inputMode="decimal"
            value={azimuth}
            maxLength={10}
            hint="From the notch; blank: not taken"
            error={azimuthOf({ azimuth }) === null ? NO_ANGLE : undefined}
            onChange={({ currentTarget: { value } }) => onAzimuth(profile, value)}
          />
        ))}
    </div>
  );
}

const NO_ANGLE = "An angle of 0 to 360°";

import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { ScanOf } from "#app/lib/scan-import/name-guess.ts";
import { azimuthOf } from "#app/lib/scan-import/pairs.ts";

interface Props {
  of: ScanOf;
  /** what the name of the file proposes */
  proposed: ScanOf;
  onOf: (of: Partial<ScanOf>) => void;
}

const SIDES = [
  { value: "before", label: "before the film" },
  { value: "after", label: "after the film" },
];

/** What a scan is of. What the file's name proposes stands there to be looked at. */
export function FilePlace({ of, proposed, onOf }: Props) {
  const hint = (field: keyof ScanOf) =>
    of[field] !== "" && of[field] === proposed[field] ? "Proposed by the file’s name" : undefined;
  const line = (field: Exclude<keyof ScanOf, "side">) => ({
    name: field,
    value: of[field],
    maxLength: 60,
    hint: hint(field),
    onChange: ({ currentTarget: { value } }: { currentTarget: { value: string } }) => onOf({ [field]: value }),
  });
  return (
    <div className="grid grid-cols-2 gap-x-3 gap-y-1 tablet:grid-cols-3 wide:grid-cols-5">
      <TextField label="Wafer" {...line("wafer")} error={of.wafer.trim() === "" ? "Name the wafer" : undefined} />
      <TextField label="Lot" {...line("lot")} />
      <TextField label="Slot" {...line("slot")} />
      <TextField
        label="Azimuth from the notch, °"
        inputMode="decimal"
        {...line("azimuth")}
        hint={of.azimuth.trim() === "" ? "Blank: 0°" : hint("azimuth")}
        error={azimuthOf(of) === null ? "An angle of 0 to 360°" : undefined}
      />
      <SelectField
        label="Before or after the film"
        name="side"
        options={SIDES}
        blank="Choose"
        value={of.side}
        hint={hint("side")}
        onChange={({ currentTarget: { value } }) => onOf({ side: value as ScanOf["side"] })}
      />
    </div>
  );
}

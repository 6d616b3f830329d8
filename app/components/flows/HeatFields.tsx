import { getTextareaProps, type FieldMetadata } from "@conform-to/react";
import { useState } from "react";
import { ProfileDrawing } from "#app/components/drawings/ProfileDrawing.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { AT_PEAK_WITHIN, profileHeat, type TemperatureProfile } from "#app/engine/flow/temperature-profile.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { PROFILE_EXAMPLE, profileWords, readProfile } from "#app/lib/temperature-profile.ts";

interface Props {
  peak: FieldMetadata<string | undefined>;
  hold: FieldMetadata<string | undefined>;
  profile: FieldMetadata<string | undefined>;
}

/** How hot a step gets: its peak and the time there, or the profile that both follow from. */
export function HeatFields({ peak, hold, profile }: Props) {
  const [typed, setTyped] = useState(typeof profile.initialValue === "string" ? profile.initialValue : "");
  // What the server said is about what was sent: it goes with the first key, until the server has said something again.
  const [answered, setAnswered] = useState<string[]>();
  const error = profile.errors === answered ? undefined : profile.errors?.[0];
  const read = readProfile(typed);
  const known = read.ok ? read.profile : null;
  const fault = error ?? (read.ok ? undefined : read.message);
  const scripted = useInBrowser();
  const follows = scripted && known !== null;
  return (
    <div className="min-w-0 space-y-3">
      <div className="grid grid-cols-2 gap-3">
        {follows && <FromProfile profile={known} />}
        <fieldset disabled={follows} className={follows ? "hidden" : "contents"}>
          <QuantityField
            field={peak}
            label="Peak temperature"
            dimension="temperature"
            example="230 °C"
            hint={scripted ? undefined : "With a profile it follows from that"}
          />
          <QuantityField
            field={hold}
            label="Time at peak"
            dimension="time"
            example="120 min"
            hint={scripted ? "Blank: it does not matter" : "Blank: it does not matter, or follows from a profile"}
          />
        </fieldset>
      </div>
      <details open={typed !== "" || fault !== undefined || undefined}>
        <summary className="cursor-pointer">Temperature profile</summary>
        <div className="field mt-2">
          <label htmlFor={profile.id}>Minutes and °C, point by point</label>
          <textarea
            {...getTextareaProps(profile)}
            key={profile.key}
            rows={2}
            spellCheck={false}
            placeholder={PROFILE_EXAMPLE}
            aria-invalid={fault ? true : undefined}
            aria-describedby={profile.errorId}
            onInput={(event) => {
              setTyped(event.currentTarget.value);
              setAnswered(profile.errors);
            }}
          />
          <small id={profile.errorId} aria-live="polite">
            {fault ??
              (known
                ? profileWords(known)
                : "Points parted by semicolons, or one a line. Blank: up to the peak and back")}
          </small>
        </div>
        {known && (
          <div className="mt-2">
            <ProfileDrawing profile={known} label={`Temperature profile: ${profileWords(known)}`} />
            <p className="text-label text-quiet">°C over minutes</p>
          </div>
        )}
      </details>
    </div>
  );
}

/** Peak and time at it, as the profile gives them. */
function FromProfile({ profile }: { profile: TemperatureProfile }) {
  const { peakTemperature, holdTime } = profileHeat(profile);
  const within = formatQuantity(AT_PEAK_WITHIN, "temperatureDifference", { unit: "K" });
  const shown = [
    ["Peak temperature", formatQuantity(peakTemperature, "temperature", { unit: "°C" }), "From the profile"],
    [
      "Time at peak",
      formatQuantity(holdTime, "time", { unit: "min", significant: 3, trim: true }),
      `From the profile: within ${within} of the peak`,
    ],
  ];
  return (
    <dl className="contents">
      {shown.map(([label, value, hint]) => (
        <div key={label}>
          <dt className="text-label text-quiet">{label}</dt>
          <dd className="py-1 font-semibold">{value}</dd>
          <dd className="text-label text-quiet">{hint}</dd>
        </div>
      ))}
    </dl>
  );
}

import { ProfileDrawing } from "#app/components/drawings/ProfileDrawing.tsx";
import { PropertyTable, type Property } from "#app/components/ui/PropertyTable.tsx";
import { filmCutWords } from "#app/lib/film-cut.ts";
import type { Measured } from "#app/engine/measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { stepHandlingWords } from "#app/lib/step-handling-words.ts";
import { withPieceMark } from "#app/lib/carrier-units.ts";
import { holdWords } from "#app/lib/run-words.ts";
import { profileWords } from "#app/lib/temperature-profile.ts";
import type { StepDetail } from "#app/schemas/flow-view.ts";

/** A step for those who may not change it: everything of its form, to read. */
export function StepReading({ step }: { step: StepDetail }) {
  const words: [label: string, value: string | null][] = [
    ["Kind of step", step.kind],
    ["Peak temperature", formatQuantity(step.peakTemperature, "temperature", { unit: "°C" })],
    ["Time at peak", holdWords({ holdTime: step.holdTime, profile: step.handling.profile })],
    ["Tool", step.equipment?.name ?? "none chosen"],
    ["Exposed to", step.exposures.join(", ") || null],
    ["Held by, as planned", step.planned],
    ["Carrier", step.carrier && withPieceMark(step.carrier.name, step.carrier.identity)],
    ["Bonding material", step.bondingMaterial?.name ?? null],
    ...step.films.map(filmWords),
    ...stepHandlingWords(step.handling, step.tape),
  ];
  const { profile } = step.handling;
  const properties = measuredOf(step);
  return (
    <div className="frame min-w-0 space-y-4 p-4 tablet:p-6">
      <dl className="grid gap-x-6 gap-y-3 tablet:grid-cols-2">
        {words.map(([label, value], index) =>
          value === null ? null : (
            <div key={index}>
              <dt className="text-label text-quiet">{label}</dt>
              <dd>{value}</dd>
            </div>
          ),
        )}
      </dl>
      {profile && <ProfileDrawing profile={profile} label={`Temperature profile: ${profileWords(profile)}`} />}
      {properties.length > 0 && <PropertyTable caption="Figures of the step" properties={properties} />}
    </div>
  );
}

function filmWords({ change, side, film, coverage, lines }: StepDetail["films"][number]): [string, string] {
  const cut = change === "adds" ? filmCutWords({ coverage, lines }) : null;
  return [
    `${change === "adds" ? "Adds" : "Removes"}, ${side === "front" ? "device" : "back"} side`,
    cut ? `${film.name}, ${cut}` : film.name,
  ];
}

function measuredOf(step: StepDetail): Property[] {
  const length = (label: string, measured: Measured | null, unit = "µm"): Property => ({
    label,
    measured,
    dimension: "length",
    unit,
  });
  const films = step.films
    .filter(({ change }) => change === "adds")
    .flatMap(({ film, thickness, stress }): Property[] => [
      length(`${film.name}: thickness`, thickness),
      { label: `${film.name}: stress at 25\u00A0°C`, measured: stress, dimension: "stress", unit: "MPa", sign: true },
    ]);
  const all: Property[] = [
    length("Silicon after the step", step.siliconAfter),
    length("Width of the trim", step.trimWidth, "mm"),
    length("Depth of the trim", step.trimDepth),
    length("Thickness of the bond", step.bondThickness),
    { label: "Force of the ground face", measured: step.groundFaceForce, dimension: "forcePerLength", unit: "N/m" },
    ...films,
  ];
  return all.filter(({ measured }) => measured);
}

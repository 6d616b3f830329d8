import type { FieldMetadata } from "@conform-to/react";
import { useState, type KeyboardEvent, type PointerEvent } from "react";
import { spotWords } from "#app/lib/spot-words.ts";
import type { WaferSpot } from "#app/schemas/incident.ts";
import { SPOT_BOX, SPOT_RADIUS, WaferSpotDrawing } from "./WaferSpotDrawing.tsx";

interface Props {
  radius: FieldMetadata<string | undefined>;
  azimuth: FieldMetadata<string | undefined>;
}

/** A step of an arrow key: degrees round the wafer, per cent of the radius outwards. */
const TURN = 5;
const OUT = 5;

const numberOf = (text: string) =>
  /^\d+(?:[.,]\d+)?$/.test(text.trim()) ? Number(text.trim().replace(",", ".")) : null;

/** Where on the wafer: a tap on its picture, arrow keys there, or two figures. All three say the same. */
export function SpotFields({ radius, azimuth }: Props) {
  const [out, setOut] = useState(radius.initialValue ?? "");
  const [angle, setAngle] = useState(azimuth.initialValue ?? "");
  const spot = spotOf(out, angle);
  const put = (percent: number, degrees: number) => {
    setOut(String(Math.min(100, Math.max(0, Math.round(percent)))));
    setAngle(String(((Math.round(degrees) % 360) + 360) % 360));
  };
  const clear = () => {
    setOut("");
    setAngle("");
  };
  const tap = (event: PointerEvent<HTMLDivElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const scale = SPOT_BOX / box.width;
    const x = (event.clientX - box.left - box.width / 2) * scale;
    const y = (event.clientY - box.top - box.height / 2) * scale;
    put((100 * Math.hypot(x, y)) / SPOT_RADIUS, (Math.atan2(x, y) * 180) / Math.PI);
  };
  const press = (event: KeyboardEvent<HTMLDivElement>) => {
    const [percent, degrees] = [numberOf(out) ?? 50, numberOf(angle) ?? 0];
    if (event.key === "ArrowUp") put(percent + OUT, degrees);
    else if (event.key === "ArrowDown") put(percent - OUT, degrees);
    else if (event.key === "ArrowRight") put(percent, degrees + TURN);
    else if (event.key === "ArrowLeft") put(percent, degrees - TURN);
    else if (event.key === "Delete" || event.key === "Backspace") clear();
    else return;
    event.preventDefault();
  };
  return (
    <fieldset className="min-w-0">
      <legend className="mb-1 font-semibold">Where on the wafer</legend>
      <p id="spot-help" className="mb-2 max-w-100 text-quiet">
        Device side towards you, notch down. Tap the picture, or use its arrow keys: left and right go round, up goes
        outwards, Delete clears. Leave it out where nobody knows.
      </p>
      <div className="flex flex-wrap items-start gap-4">
        <div
          id="spot"
          role="application"
          aria-roledescription="picture of a wafer"
          aria-label={spot ? `Place on the wafer: ${spotWords(spot)}` : "Place on the wafer: none yet"}
          aria-describedby="spot-help"
          tabIndex={0}
          onPointerDown={tap}
          onKeyDown={press}
          className="w-64 max-w-full cursor-crosshair touch-manipulation"
        >
          <WaferSpotDrawing spot={spot} />
        </div>
        <div className="w-44 space-y-2">
          <Figure field={radius} label="How far out, % of the radius" value={out} onType={setOut} />
          <Figure field={azimuth} label="Angle from the notch, °" value={angle} onType={setAngle} />
          <p aria-live="polite" className="text-label text-quiet">
            {spot ? spotWords(spot) : "No place is marked."}
          </p>
          {(out !== "" || angle !== "") && (
            <button type="button" className="btn" onClick={clear}>
              Clear the place
            </button>
          )}
        </div>
      </div>
    </fieldset>
  );
}

function spotOf(out: string, angle: string): WaferSpot | null {
  const percent = numberOf(out);
  const degrees = numberOf(angle) ?? (percent === 0 ? 0 : null);
  if (percent === null || degrees === null || percent > 100 || degrees > 360) return null;
  return { radius: percent / 100, azimuth: ((degrees % 360) * Math.PI) / 180 };
}

function Figure({
  field,
  label,
  value,
  onType,
}: {
  field: Props["radius"];
  label: string;
  value: string;
  onType: (text: string) => void;
}) {
  return (
    <div className="field">
      <label htmlFor={field.id}>{label}</label>
      <input
        id={field.id}
        name={field.name}
        value={value}
        onChange={(event) => onType(event.currentTarget.value)}
        inputMode="decimal"
        autoComplete="off"
        aria-invalid={field.errors ? true : undefined}
        aria-describedby={field.errorId}
      />
      <small id={field.errorId}>{field.errors?.[0] ?? "Blank: not known"}</small>
    </div>
  );
}

import type { TemperatureProfile } from "#app/engine/flow/temperature-profile.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { formatBare } from "#app/lib/format-measured.ts";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { textWidth } from "./text-width.ts";
import { OwnFigure, useOwnText } from "#app/components/units/OwnFigure.tsx";

interface Props {
  profile: TemperatureProfile;
  /** the profile in words */
  label: string;
}

const WIDTH = 360;
const HEIGHT = 112;
const FRAME = { left: 34, right: WIDTH - 24, top: 18, bottom: 88 };
const TEXT = 12.5;
const GAP = 8;

/** A step's temperature over its time, drawn small: the line, the temperatures at which it turns or stays, and the minutes. */
export function ProfileDrawing({ profile, label }: Props) {
  const own = useOwnText();
  const last = profile.at(-1)?.time ?? 0;
  const temperatures = profile.map(({ temperature }) => temperature);
  const [low, high] = [Math.min(ROOM_TEMPERATURE, ...temperatures), Math.max(ROOM_TEMPERATURE + 1, ...temperatures)];
  const x = (time: number) => FRAME.left + (time / last) * (FRAME.right - FRAME.left);
  const y = (kelvin: number) => FRAME.bottom - ((kelvin - low) / (high - low)) * (FRAME.bottom - FRAME.top);
  const path = profile
    .map(({ time, temperature }, at) => `${at === 0 ? "M" : "L"}${coordinate(x(time))} ${coordinate(y(temperature))}`)
    .join("");
  return (
    <svg
      className="block h-auto max-w-full overflow-visible"
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      width={WIDTH}
      height={HEIGHT}
      role="img"
      aria-label={own(label)}
    >
      <path d={`M${FRAME.left} ${coordinate(y(ROOM_TEMPERATURE))}H${FRAME.right}`} stroke={colour("line")} />
      <text
        x={FRAME.left - 6}
        y={coordinate(y(ROOM_TEMPERATURE) + 4)}
        textAnchor="end"
        style={{ fill: colour("quiet") }}
      >
        <OwnFigure unit="°C">25</OwnFigure>
      </text>
      <path d={`${path}`} fill="none" stroke={colour("silicon")} strokeWidth="1.5" strokeLinejoin="round" />
      {spaced(
        named(profile).map((at) => ({ at, middle: x(profile[at]?.time ?? 0), text: degrees(temperatures[at]) })),
      ).map(({ at, middle, text }) => (
        <text key={at} x={coordinate(middle)} y={coordinate(y(temperatures[at] ?? low) - 5)} textAnchor="middle">
          <OwnFigure unit="°C">{text}</OwnFigure>
        </text>
      ))}
      {spaced(profile.map(({ time }, at) => ({ at, middle: x(time), text: formatBare(time, "time", "min") }))).map(
        ({ at, middle, text }) => (
          <text key={at} x={coordinate(middle)} y={HEIGHT - 5} textAnchor="middle" style={{ fill: colour("quiet") }}>
            {text}
          </text>
        ),
      )}
    </svg>
  );
}

const degrees = (kelvin = ROOM_TEMPERATURE) => formatBare(kelvin, "temperature", "°C");

/** Points whose temperature is written: the hottest first, then the beginning of each stay and turn above 25 °C. */
function named(profile: TemperatureProfile): number[] {
  const hottest = Math.max(...profile.map(({ temperature }) => temperature));
  return profile
    .map(({ temperature }, at) => ({ at, temperature, before: profile[at - 1]?.temperature }))
    .filter(({ temperature, before }) => temperature > ROOM_TEMPERATURE + 5 && temperature !== before)
    .sort((a, b) => Number(b.temperature === hottest) - Number(a.temperature === hottest) || a.at - b.at)
    .map(({ at }) => at);
}

interface Word {
  at: number;
  middle: number;
  text: string;
}

/** Those that do not run into one that is there already; the end comes before what lies between. */
function spaced(words: Word[]): Word[] {
  const [first, ...rest] = words;
  const order = first ? [first, ...rest.slice(-1), ...rest.slice(0, -1)] : [];
  const apart = (a: Word, b: Word) =>
    Math.abs(a.middle - b.middle) >= (textWidth(a.text, TEXT) + textWidth(b.text, TEXT)) / 2 + GAP;
  return order.reduce<Word[]>((kept, word) => (kept.every((other) => apart(word, other)) ? [...kept, word] : kept), []);
}

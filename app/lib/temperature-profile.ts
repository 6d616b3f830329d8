import type { TemperatureProfile } from "#app/engine/flow/temperature-profile.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { formatBare } from "./format-measured.ts";
import { readQuantity } from "./read-quantity.ts";

/** A profile as it was typed: understood, blank as null, or what is wrong with it and where. */
export type ReadProfile = { ok: true; profile: TemperatureProfile | null } | { ok: false; message: string };

export const PROFILE_EXAMPLE = "0 25; 30 150; 60 150; 90 230; 120 25";
const MOST_POINTS = 40;
const NUMBER = "[+-]?\\d+(?:[.,]\\d+)*";
const UNIT = "[a-zA-Z°]+(?: [CFK](?![a-zA-Z]))?";
const POINT = new RegExp(`^(${NUMBER}) ?(${UNIT})?(?: ?, | ?[:/] ?| )(${NUMBER}) ?(${UNIT})?$`);

const refuse = (message: string): ReadProfile => ({ ok: false, message });

/**
 * Reads a temperature profile: points of minutes and °C with a blank between them, set apart by semicolons or on lines of their own.
 * Other units may be typed. What could be read in two ways is refused, with the point that it stands in. The same on the server and
 * while it is being typed.
 */
export function readProfile(typed: string | null | undefined): ReadProfile {
  const points = (typed ?? "")
    .replace(/[\u2212\u2013]/g, "-")
    .replace(/º/g, "°")
    .split(/[;\r\n]+/)
    .map((point) => point.replace(/[\s\u00A0\u2009\u202F]+/g, " ").trim())
    .filter((point) => point !== "");
  if (points.length === 0) return { ok: true, profile: null };
  if (points.length > MOST_POINTS) return refuse(`${points.length} points; a profile takes at most ${MOST_POINTS}.`);
  const profile: TemperatureProfile = [];
  for (const [index, point] of points.entries()) {
    const read = readPoint(point);
    if ("fault" in read) return refuse(`Point ${index + 1}: ${read.fault}`);
    const before = profile.at(-1);
    if (!before && read.time !== 0)
      return refuse(`Point 1 is at ${minutes(read.time)}: begin at 0, with what it is then.`);
    if (before && !(read.time > before.time))
      return refuse(
        `Point ${index + 1} is at ${minutes(read.time)}, not after point ${index} at ${minutes(before.time)}. Minutes come first, then °C.`,
      );
    profile.push(read);
  }
  if (profile.length < 2) return refuse(`One point alone is no profile. Type for example ${PROFILE_EXAMPLE}.`);
  return { ok: true, profile };
}

const minutes = (time: number) => formatQuantity(time, "time", { unit: "min" });

function readPoint(point: string): { time: number; temperature: number } | { fault: string } {
  const match = POINT.exec(point);
  if (!match) return { fault: notAPoint(point) };
  const [, first = "", timeUnit = "min", second = "", degrees = "°C"] = match;
  const time = readQuantity(`${first} ${timeUnit}`, { ...RULES.holdTime, label: "time" });
  if (!time.ok) return { fault: time.message };
  const temperature = readQuantity(`${second} ${degrees}`, RULES.temperature);
  if (!temperature.ok) return { fault: temperature.message };
  return { time: time.value, temperature: temperature.value };
}

function notAPoint(point: string): string {
  const count = point.match(new RegExp(NUMBER, "g"))?.length ?? 0;
  const shown = `“${point.slice(0, 40)}”`;
  if (/^[+-]?\d+,\d+$/.test(point)) return `${shown} is one number with decimals or two: type minutes, a blank and °C.`;
  if (count === 1) return `${shown} has one number only: type minutes, a blank and °C.`;
  if (count > 2)
    return `${shown} has ${count} numbers where minutes and °C belong. Part points by a semicolon or a new line, and no thousands.`;
  return `${shown} cannot be read as minutes and °C. Type for example 30 150.`;
}

const bareMinutes = (time: number) => formatBare(time, "time", "min");
const bareCelsius = (temperature: number) => formatBare(temperature, "temperature", "°C");

/** A profile as the text of its field, which reads back to the same profile. */
export function profileText(profile: TemperatureProfile | null | undefined): string {
  const exact = { significant: 12, trim: true } as const;
  return (profile ?? [])
    .map(({ time, temperature }) =>
      [
        formatQuantity(time, "time", { unit: "min", ...exact }),
        formatQuantity(temperature, "temperature", { unit: "°C", ...exact }),
      ]
        .map((text) =>
          text
            .replaceAll("\u00A0", " ")
            .replaceAll("\u2212", "-")
            .replace(/ (min|°C)$/, "")
            .replaceAll(" ", ""),
        )
        .join(" "),
    )
    .join("; ");
}

/** A profile in a sentence: '25 °C, in 30 min to 150 °C, 30 min there, in 30 min to 230 °C; 90 min in all.' */
export function profileWords(profile: TemperatureProfile): string {
  const legs = profile.slice(1).map((to, at) => {
    const from = profile[at] ?? to;
    const time = `${bareMinutes(to.time - from.time)} min`;
    return to.temperature === from.temperature ? `${time} there` : `in ${time} to ${bareCelsius(to.temperature)} °C`;
  });
  const start = `${bareCelsius(profile[0]?.temperature ?? 0)} °C`;
  return `${[start, ...legs].join(", ")}; ${bareMinutes(profile.at(-1)?.time ?? 0)} min in all.`.replaceAll(
    / (?=min|°C)/g,
    "\u00A0",
  );
}

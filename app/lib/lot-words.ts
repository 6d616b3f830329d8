import type { EngineInputError } from "#app/engine/errors.ts";
import { slotsInWords } from "#app/engine/flow/legs.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ExpectedShare } from "./lot-expected.ts";
import type { LotInput, WaferAnswer } from "#app/schemas/lot.ts";
import { micrometres } from "./assessment-figure.ts";
import { count } from "./count-words.ts";
import { SLOTS } from "./cassette.ts";

/** A figure of a lot that no flow comes of, at the field that it was typed in. */
export function lotFault(
  { field, reason, allowed }: EngineInputError,
  { wafers }: Pick<LotInput, "wafers">,
): { field: "bow" | "thickness" | "wafers"; reason: string } {
  const what = field === "lot.bow" ? "bow" : "thickness";
  const sentence =
    what === "bow"
      ? `This bow ${reason}.`
      : `With this thickness nothing can be computed: ${reason}${allowed ? ` (allowed: ${allowed})` : ""}.`;
  return { field: wafers.length > 0 ? "wafers" : what, reason: sentence };
}

/** A bow with its sign, µm. */
export const bowText = (bow: number) => `${bow > 0 ? "+" : ""}${micrometres(bow)}`;

/** How many of a lot miss a limit, how many are near one, how many cannot be judged. */
export interface LotCounts {
  wafers: number;
  missed: number;
  near: number;
  unknown: number;
}

export function lotCounts(answers: readonly Pick<WaferAnswer, "outcome">[]): LotCounts {
  const of = (outcome: WaferAnswer["outcome"]) => answers.filter((each) => each.outcome === outcome).length;
  return {
    wafers: answers.length,
    missed: of("do not run"),
    near: of("caution"),
    unknown: of("cannot judge"),
  };
}

/** '3 of 25 wafers miss the limit of a tool: slots 4, 9 and 17. Two more come near one.' */
export function spreadSentences(answers: readonly WaferAnswer[]): string[] {
  const { wafers, missed, near, unknown } = lotCounts(answers);
  const slots = answers.filter(({ outcome }) => outcome === "do not run").map(({ slot }) => String(slot));
  const sentences = [
    missed === 0
      ? `None of ${wafers} wafers misses the warp limit of a tool.`
      : `${missed} of ${wafers} wafers ${missed === 1 ? "misses" : "miss"} the warp limit of a tool: ${
          missed === wafers ? "every one" : `${missed === 1 ? "slot" : "slots"} ${listed(slots)}`
        }.`,
  ];
  if (near > 0)
    sentences.push(`${capital(count(near))}${missed > 0 ? " more" : ""} ${near === 1 ? "comes" : "come"} near one.`);
  if (unknown > 0) sentences.push(`${capital(count(unknown))} cannot be judged, which is no pass.`);
  return sentences;
}

const listed = (words: string[]) =>
  words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** What any lot comes to, in wafers of a full cassette; where its slots part, of those that come out worst. */
export function expectedSentences({ step, title, share, lots: [least, most], slots, by }: ExpectedShare): string[] {
  const place = `the tightest limit, that of step ${step}, ${title}`;
  const all = slots?.length ?? SLOTS;
  const of = (part: number) => inWafers(part, all);
  const where = slots ? ` in ${slotsInWords(slots)}` : "";
  const expected =
    of(most) === "none"
      ? `With the tolerances given, no wafer of any lot${where} is expected beyond ${place}.`
      : `With the tolerances given, ${of(share)} of ${all} wafers${where} ${share * all < 1.5 ? "is" : "are"} expected beyond ${place}.`;
  const range = of(least) === of(most) ? "" : `Of 95 lots in 100 it is between ${of(least)} and ${of(most)}.`;
  return [expected, range, by].filter((sentence) => sentence !== "");
}

/** 'fewer than 1', 'about 3', 'nearly all'. */
function inWafers(share: number, all: number): string {
  const wafers = share * all;
  if (wafers < 0.05) return "none";
  if (wafers < 1) return "fewer than 1";
  if (wafers > all - 0.5) return "nearly all";
  return `about ${formatQuantity(Math.round(wafers), "number", { decimals: 0 })}`;
}

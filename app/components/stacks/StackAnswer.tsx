import { memo } from "react";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { directionWords } from "#app/lib/film-cut.ts";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import {
  againstFreeWafer,
  answerOutcome,
  answerSentences,
  bareFrom,
  becauseSentence,
  cautions,
  lengthWords,
  limitWords,
  radiusWords,
  ratioWords,
  temperatureWords,
  thicknessWords,
  warpWords,
  type Estimated,
} from "#app/lib/stack-words.ts";
import { PanelStatus, type Status } from "./PanelStatus.tsx";
import { Remark } from "./Remark.tsx";

interface Props {
  panel: StackPanel | null;
  limits: SiteLimits;
  status: Status;
}

/**
 * The answer first: what holds the wafer, one or two sentences, and the figures that they rest on. Drawn anew only when one of them says
 * something else; the ways on of a status are the same for the same words.
 */
export const StackAnswer = memo(
  AnswerSection,
  (before, after) =>
    before.panel === after.panel &&
    before.limits === after.limits &&
    JSON.stringify(before.status) === JSON.stringify(after.status),
);

function AnswerSection({ panel, limits, status }: Props) {
  if (!panel)
    return (
      <section aria-label="Answer" className="p-4 tablet:p-6">
        <PanelStatus status={status} before />
        <p className="mt-2 text-figure font-medium">
          The answer appears here as soon as silicon and films say enough to work it out.
        </p>
      </section>
    );
  const { room, hot } = panel;
  const { class: support } = room.answer.support;
  const at = thicknessWords(room.request.wafer.thickness_m);
  const stale = status.kind !== "current";
  return (
    <section aria-label="Answer">
      <div className="p-4 tablet:px-6 tablet:pt-5 tablet:pb-4">
        <div className="flex flex-wrap items-baseline gap-x-4">
          <FindingTag outcome={answerOutcome(room, limits)}>
            {support === null ? `at ${at}` : `${support} at ${at}`}
          </FindingTag>
          <PanelStatus status={status} />
        </div>
        <h2 className={`mt-2 text-figure font-medium text-pretty ${stale ? "text-quiet" : ""}`}>
          {answerSentences(room, hot, limits).map((sentence) => (
            <span key={sentence} className="block">
              {noBreak(sentence)}{" "}
            </span>
          ))}
        </h2>
        <p className="mt-2 text-label text-quiet">{noBreak(becauseSentence(room))}</p>
        {cautions(room, limits).map((caution) => (
          <Remark key={caution}>{noBreak(caution)}</Remark>
        ))}
      </div>
      <dl
        className={`grid grid-cols-[repeat(auto-fit,minmax(124px,1fr))] overflow-hidden border-t border-line ${stale ? "text-quiet" : ""}`}
      >
        {figuresOf(panel, limits).map(({ label, value, second }) => (
          <div
            key={label}
            className="-mt-px -ml-px border-t border-l border-line px-3 py-2 first:pl-4 first:tablet:pl-6"
          >
            <dt className="text-label text-quiet">{noBreak(label)}</dt>
            <dd>
              <span className="block text-lead font-medium">{noBreak(value)}</span>
              <span className="block text-label text-quiet">{noBreak(second)}</span>
            </dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

interface PanelFigure {
  label: string;
  value: string;
  second: string;
}

function figuresOf({ room, hot }: StackPanel, limits: SiteLimits): PanelFigure[] {
  const { film_force, shape, stoney, curls_below_m } = room.answer;
  const bare = bareFrom(room, limits);
  const force = (value: number) =>
    formatQuantity(value, "forcePerLength", { unit: "N/m", significant: 3, trim: true, sign: true });
  return [
    shapeFigure(room, "25\u00A0°C"),
    ...(hot ? [shapeFigure(hot, temperatureWords(hot.request.temperature_K ?? ROOM_TEMPERATURE))] : []),
    {
      label: "Stoney’s bow",
      value: lengthWords(stoney.bow_m, true),
      second: againstFreeWafer(stoney.bow_m, shape),
    },
    {
      label: "Film force",
      value: force(film_force.front_N_per_m),
      second: `device side; back ${force(film_force.back_N_per_m)}`,
    },
    {
      label: "Load to curling load",
      value: `${ratioWords(shape.stability_ratio)} to 1`,
      second: curls_below_m === null ? "does not curl" : `1 at ${limitWords(curls_below_m)}`,
    },
    ...(bare === null
      ? []
      : [
          {
            label: "Least silicon, bare",
            value: limitWords(bare),
            second: curls_below_m === bare ? "thinner, it curls" : "the site’s limit",
          },
        ]),
  ];
}

/** Of a wafer with lines both bows, the larger first with the axis that it lies along. */
function bowWords({ bow_m, across }: Estimated["answer"]["shape"]): string {
  if (!across) return lengthWords(bow_m, true);
  return `${lengthWords(bow_m, true)} ${directionWords(across.axis_rad)}, ${lengthWords(across.bow_m, true)} across that`;
}

/** Warp with its signed bow; a curled wafer has no bow but a roll radius and a lift. */
function shapeFigure({ answer: { shape } }: Estimated, at: string): PanelFigure {
  if (shape.regime === "curled" && shape.roll_radius_m !== null)
    return {
      label: `Roll radius, ${at}`,
      value: radiusWords(shape.roll_radius_m),
      second: `edge lift ${lengthWords(shape.warp_m)}`,
    };
  return {
    label: `Warp, ${at}`,
    value: warpWords(shape),
    second: `bow ${bowWords(shape)}, device side up${warpWords(shape).includes("±") ? "; ± is k = 2" : ""}`,
  };
}

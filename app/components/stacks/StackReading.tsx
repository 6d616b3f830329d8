import { useState } from "react";
import { Form, Link } from "react-router";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { filmCutWords } from "#app/lib/film-cut.ts";
import type { StackAround } from "#app/lib/stack-around.ts";
import { stackDraft, type DraftLayer } from "#app/lib/stack-draft.ts";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import { viewTemperature } from "#app/lib/stack-view.ts";
import { lengthWords, thicknessWords } from "#app/lib/stack-words.ts";
import { StackAnswer } from "./StackAnswer.tsx";
import { stressWords } from "./stack-cut-layers.ts";
import { StackCut } from "./StackCut.tsx";
import { StackFindings } from "./StackFindings.tsx";
import { StackPanes } from "./StackPanes.tsx";
import { ViewOptions } from "./ViewOptions.tsx";

interface Props extends StackAround {
  text: StackText;
  panel: StackPanel | null;
}

/** A stack for those who look at it and don't change it. */
export function StackReading({ text, panel, choices, limits, view, overlay, others }: Props) {
  const draft = stackDraft(text, choices);
  const [at, setAt] = useState(view.at);
  const { read } = viewTemperature(at);
  return (
    <StackPanes
      build={
        <>
          <p className="border-b border-ink p-4 tablet:px-5">
            {draft.silicon?.name}. Remaining: {draft.thickness !== null && thicknessWords(draft.thickness)}
            {draft.tolerance !== null && `, tolerance ± ${thicknessWords(draft.tolerance)}`}.
          </p>
          <div className="p-4 tablet:px-0">
            <StackCut draft={draft} panel={panel} limits={limits} />
          </div>
          <Films layers={draft.layers} />
          {text.note && <p className="border-t border-line p-4 tablet:px-5">{text.note}</p>}
        </>
      }
      answer={<StackAnswer panel={panel} limits={limits} status={{ kind: "current" }} />}
      findings={
        <StackFindings
          name={text.name}
          draft={draft}
          panel={panel}
          overlay={overlay}
          limits={limits}
          options={
            <Form method="get">
              <ViewOptions
                view={view}
                others={others}
                typed={{
                  at,
                  understood: read?.ok ? read.understood : undefined,
                  fault: read && !read.ok ? read.message : undefined,
                  onType: setAt,
                }}
              />
              <noscript>
                <button type="submit" className="btn mb-3">
                  Show
                </button>
              </noscript>
            </Form>
          }
        />
      }
    />
  );
}

/** The films top to bottom, with where their values come from. */
function Films({ layers }: { layers: readonly DraftLayer[] }) {
  if (layers.length === 0) return null;
  return (
    <div className="overflow-x-auto border-t border-line" tabIndex={0} role="region" aria-label="Films">
      <table className="table">
        <caption className="sr-only">Films, top to bottom</caption>
        <thead>
          <tr>
            <th scope="col">Film</th>
            <th scope="col">Side</th>
            <th scope="col" className="num">
              Thickness
            </th>
            <th scope="col">Covers</th>
            <th scope="col" className="num">
              Stress at 25&nbsp;°C
            </th>
            <th scope="col">Source of stress</th>
          </tr>
        </thead>
        <tbody>
          {layers.map(({ name, film, side, thickness, cut, stress }, index) => (
            <tr key={index}>
              <th scope="row" className="font-normal">
                {film ? (
                  <Link to={`/films/${film.id}`} className="link">
                    {name}
                  </Link>
                ) : (
                  name
                )}
              </th>
              <td>{side === "front" ? "device side" : "back side"}</td>
              <td className="num">{thickness === null ? "–" : lengthWords(thickness)}</td>
              <td>{cut ? (filmCutWords(cut) ?? "all of it") : "–"}</td>
              <td className="num">{stress ? stressWords(stress.value) : "–"}</td>
              <td>{stress && <SourceMark kind={stress.source} />}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

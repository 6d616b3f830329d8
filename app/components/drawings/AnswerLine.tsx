import type { ReactNode } from "react";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { FindingTag } from "./FindingTag.tsx";
import { noBreak } from "./no-break.ts";

export interface AnswerFigure {
  label: string;
  value: string;
  /** Link to the figure's working, or to where it comes from. */
  working?: ReactNode;
}

export interface AnswerLineProps {
  /** Left out where nothing is judged, as for a measurement. */
  outcome?: Outcome;
  /** Beside the outcome, such as 'first at step 9'. */
  where?: string;
  /** One or two plain sentences; each is set as a line of its own. */
  sentences: readonly string[];
  /** Four figures, 2 × 2; a row of four on one pane. */
  figures: readonly AnswerFigure[];
  /** Level of the heading that the sentences are. */
  level?: 1 | 2;
  /** Figures in a row under the sentences, for values that come with their uncertainty. */
  figuresBelow?: boolean;
}

/** The answer first: outcome, sentences in plain words, then the figures. Sits at the top of a frame. */
export function AnswerLine({ outcome, where, sentences, figures, level = 1, figuresBelow = false }: AnswerLineProps) {
  const Heading = level === 1 ? "h1" : "h2";
  return (
    <section className={`grid ${figuresBelow ? "" : "wide:grid-cols-[minmax(0,1fr)_384px]"}`} aria-label="Answer">
      <div className="p-4 tablet:pt-6 tablet:pr-10 tablet:pb-7 tablet:pl-6">
        {outcome && <FindingTag outcome={outcome}>{where}</FindingTag>}
        <Heading
          className={`${outcome ? "mt-3 " : ""}max-w-[40em] text-figure font-medium text-pretty tablet:text-answer`}
        >
          {sentences.map((sentence) => (
            <span key={sentence} className="block">
              {noBreak(sentence)}{" "}
            </span>
          ))}
        </Heading>
      </div>
      <dl
        className={`grid overflow-hidden border-t border-line ${
          figuresBelow
            ? "tablet:grid-cols-2 wide:grid-cols-4"
            : "grid-cols-2 tablet:grid-cols-4 wide:grid-cols-2 wide:border-t-0 wide:border-l"
        }`}
      >
        {figures.map((figure) => (
          <div
            key={figure.label}
            className="-mt-px -ml-px border-t border-l border-line px-3 py-2 tablet:px-4 tablet:py-3"
          >
            <dt className="text-label text-quiet">{figure.label}</dt>
            <dd>
              <span className="block text-figure font-medium">{noBreak(figure.value)}</span>
              {figure.working === undefined ? null : <span className="block text-label">{figure.working}</span>}
            </dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

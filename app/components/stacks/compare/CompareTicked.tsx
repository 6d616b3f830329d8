import { Form } from "react-router";
import { count } from "#app/lib/count-words.ts";
import { MOST_STACKS } from "#app/lib/stack-comparison/asked.ts";

/** Id of the form that the boxes of the list belong to. */
export const TICK_FORM = "compare-ticked";

interface Props {
  ticked: ReadonlySet<string>;
  /** ids whose boxes are on this page of the list */
  onPage: readonly string[];
  onClear: (form: HTMLFormElement | null) => void;
}

/** Compares the stacks that are ticked in the list, those on other pages of it as well. */
export function CompareTicked({ ticked, onPage, onClear }: Props) {
  return (
    <Form
      id={TICK_FORM}
      method="get"
      action="/stacks/compare"
      aria-label="Compare stacks"
      className="screen-only mb-3 flex flex-wrap items-center gap-x-4 gap-y-2"
    >
      {[...ticked]
        .filter((id) => !onPage.includes(id))
        .map((id) => (
          <input key={id} type="hidden" name="of" value={id} />
        ))}
      <button type="submit" className="btn" aria-describedby="compare-hint">
        {ticked.size > 0 ? `Compare ${ticked.size} ${ticked.size === 1 ? "stack" : "stacks"}` : "Compare stacks ticked"}
      </button>
      <span id="compare-hint" className="text-quiet" role="status">
        {hint(ticked.size)}
      </span>
      {ticked.size > 0 ? (
        <button
          type="button"
          className="link min-h-8 cursor-pointer"
          onClick={(event) => onClear(event.currentTarget.form)}
        >
          Untick all
        </button>
      ) : null}
    </Form>
  );
}

function hint(ticked: number): string {
  if (ticked > MOST_STACKS) return `At most ${count(MOST_STACKS)}: untick ${count(ticked - MOST_STACKS)}.`;
  if (ticked === 1) return "Tick one more.";
  return ticked === 0 ? "Tick two to six." : "";
}

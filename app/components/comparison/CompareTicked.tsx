import { Form } from "react-router";
import { count } from "#app/lib/count-words.ts";
import { MOST_COMPARED } from "#app/lib/comparison/asked.ts";
import { comparisonPath, type ComparedKind } from "#app/lib/comparison/kinds.ts";

/** Id of the form that the boxes of the list belong to. */
export const TICK_FORM = "compare-ticked";

interface Props {
  kind: ComparedKind;
  ticked: ReadonlySet<string>;
  /** ids whose boxes are on this page of the list */
  onPage: readonly string[];
  onClear: (form: HTMLFormElement | null) => void;
}

/** Compares what is ticked in the list, those on other pages of it as well. */
export function CompareTicked({ kind, ticked, onPage, onClear }: Props) {
  return (
    <Form
      id={TICK_FORM}
      method="get"
      action={comparisonPath(kind)}
      aria-label={`Compare ${kind.many}`}
      className="screen-only mb-3 flex flex-wrap items-center gap-x-4 gap-y-2"
    >
      {[...ticked]
        .filter((id) => !onPage.includes(id))
        .map((id) => (
          <input key={id} type="hidden" name="of" value={id} />
        ))}
      <button type="submit" className="btn" aria-describedby="compare-hint">
        {ticked.size > 0
          ? `Compare ${ticked.size} ${ticked.size === 1 ? kind.one : kind.many}`
          : `Compare ${kind.many} ticked`}
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
  if (ticked > MOST_COMPARED) return `At most ${count(MOST_COMPARED)}: untick ${count(ticked - MOST_COMPARED)}.`;
  if (ticked === 1) return "Tick one more.";
  return ticked === 0 ? "Tick two to six." : "";
}

import { useEffect, useRef, type SubmitEvent } from "react";
import { useSubmit } from "react-router";
import { tickedWords, type TickAction } from "#app/lib/ticked-words.ts";
import { TICKED, type Ticks } from "./use-ticked.ts";

interface Props {
  ticks: Ticks;
  /** what a row is called: one, several */
  what: readonly [string, string];
  /** ids whose boxes are on this page of the list */
  onPage: readonly string[];
  actions: readonly TickAction[];
}

/**
 * What can be done with the rows that are ticked in the list under it, those on other pages of it as well. A plain form: without scripts
 * the boxes of the page are sent. While something is ticked it stays in view.
 */
export function TickBar({ ticks, what, onPage, actions }: Props) {
  const form = useRef<HTMLFormElement>(null);
  const submit = useSubmit();
  const { ids } = ticks;
  // What was ticked before the scripts came has told nobody.
  const first = useRef(ticks.read);
  useEffect(() => first.current(form.current), []);
  const send = (event: SubmitEvent<HTMLFormElement>) => {
    const { submitter } = event.nativeEvent as globalThis.SubmitEvent;
    if (!(submitter instanceof HTMLButtonElement) || submitter.dataset["file"] !== undefined) return;
    event.preventDefault();
    void submit(submitter);
  };
  return (
    <form
      ref={form}
      id={ticks.form}
      aria-label={`With ${what[1]} that are ticked`}
      onSubmit={send}
      className={`screen-only mb-3 flex flex-wrap items-center gap-x-3 gap-y-2 py-1 ${ids.size > 0 ? "sticky top-0 z-10 bg-surface" : ""}`}
    >
      {[...ids]
        .filter((id) => !onPage.includes(id))
        .map((id) => (
          <input key={id} type="hidden" name={TICKED} value={id} />
        ))}
      {actions.map(({ label, to, method = "get", removes = false, file = false }) => (
        <button
          key={label}
          type="submit"
          formAction={to}
          formMethod={method}
          // Without it a file of nothing that is ticked would be one of everything.
          name={file ? "only" : undefined}
          value={file ? "ticked" : undefined}
          data-file={file ? "" : undefined}
          className={removes ? "btn btn-remove" : "btn"}
          aria-describedby={`${ticks.form}-count`}
        >
          {label}
        </button>
      ))}
      <span id={`${ticks.form}-count`} className="text-quiet" role="status">
        {tickedWords(ids.size, what, actions)}
      </span>
      <span className="flex gap-x-3 scriptless:hidden">
        <button
          type="button"
          className="link min-h-8 cursor-pointer"
          onClick={() => ticks.onPage(form.current, !onPage.every((id) => ids.has(id)))}
        >
          {onPage.every((id) => ids.has(id)) ? "Untick this page" : "Tick all on this page"}
        </button>
        {ids.size > 0 && (
          <button type="button" className="link min-h-8 cursor-pointer" onClick={() => ticks.clear(form.current)}>
            Clear
          </button>
        )}
      </span>
    </form>
  );
}

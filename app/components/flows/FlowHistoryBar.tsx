import { useEffect, useRef, type RefObject } from "react";
import { useLocation, useNavigation, useSearchParams } from "react-router";
import { undoKey, type Direction } from "#app/lib/undo-key.ts";
import type { FlowHistory } from "#app/schemas/flow-plan.ts";
import { StepIcon } from "./StepIcon.tsx";

interface Props {
  history: FlowHistory;
  /** id of the form that changes the flow */
  form: string;
}

const time = (at: string) => at.slice(0, 16).replace("T", " ");

/** What was done last, and its way back. Undo and redo stay where they are, so that one can be pressed again and again. */
export function FlowHistoryBar({ history, form }: Props) {
  const [search] = useSearchParams();
  const done = search.get("done");
  const { undo, redo, lines } = history;
  const [last] = lines;
  const bar = useRef<HTMLDivElement>(null);
  useUndoKeys(bar);
  const { key } = useLocation();
  useEffect(() => {
    // What was pressed has gone with its row, so the focus goes to the way back.
    const way = done === "remove" ? "undo" : done === "undo" || done === "redo" ? done : null;
    if (way) bar.current?.querySelector<HTMLButtonElement>(`button[value=${way}]`)?.focus();
  }, [key, done]);
  if (!last) return null;
  return (
    <div
      ref={bar}
      className="screen-only flex flex-wrap items-start gap-x-4 gap-y-2 border-b border-line px-4 py-2 tablet:px-6"
    >
      <div className="flex gap-2">
        <HistoryButton direction="undo" words={undo} form={form} />
        <HistoryButton direction="redo" words={redo} form={form} />
      </div>
      <details className="min-w-0 flex-1 basis-60 py-1.5">
        <summary className="cursor-pointer">
          <span role="status">{last.words}.</span>{" "}
          <span className="text-quiet">
            {last.by}, {time(last.at)} UTC
          </span>
        </summary>
        <ol className="mt-2 max-h-60 overflow-y-auto" tabIndex={0} aria-label="Changes of this flow, newest first">
          {lines.map(({ number, words, by, at }) => (
            <li key={number} className="border-t border-line py-1 first:border-0">
              {words}
              <span className="block text-label text-quiet">
                {by}, {time(at)} UTC
              </span>
            </li>
          ))}
        </ol>
      </details>
    </div>
  );
}

interface HistoryButtonProps {
  direction: "undo" | "redo";
  words: string | null;
  form: string;
}

function HistoryButton({ direction, words, form }: HistoryButtonProps) {
  const name = direction === "undo" ? "Undo" : "Redo";
  return (
    <button
      type="submit"
      form={form}
      name="intent"
      value={direction}
      className="btn inline-flex items-center gap-1.5 aria-disabled:cursor-default aria-disabled:border-line aria-disabled:text-quiet"
      aria-disabled={words === null ? true : undefined}
      title={words === null ? undefined : `${name}: ${words}`}
      onClick={words === null ? (event) => event.preventDefault() : undefined}
    >
      <StepIcon kind={direction} />
      {name}
    </button>
  );
}

/**
 * The keys that take back and do again; in a field they are the browser's own. Presses that come while one is on its way wait for it.
 */
function useUndoKeys(bar: RefObject<HTMLElement | null>): void {
  const idle = useNavigation().state === "idle";
  const waiting = useRef<Direction[]>([]);
  useEffect(() => {
    const next = () => {
      const direction = idle ? waiting.current.shift() : undefined;
      const button = direction && bar.current?.querySelector<HTMLButtonElement>(`button[value=${direction}]`);
      if (!button) return;
      if (button.ariaDisabled === "true") waiting.current = [];
      button.click();
    };
    const press = (event: KeyboardEvent) => {
      const direction = undoKey(event);
      const inField = event.target instanceof HTMLElement && event.target.closest("input, textarea, select") !== null;
      if (!direction || inField) return;
      event.preventDefault();
      waiting.current.push(direction);
      next();
    };
    next();
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, [bar, idle]);
}

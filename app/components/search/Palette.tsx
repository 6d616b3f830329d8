import { useEffect, useId, useRef, useState, type KeyboardEvent } from "react";
import { useNavigate } from "react-router";
import { countFound, nothingFound } from "#app/lib/search-words.ts";
import { PaletteOptions } from "./PaletteOptions.tsx";
import { optionsOf } from "./palette-option.ts";
import { useFound, type Found } from "./use-found.ts";

/** Search over everything, by keys alone: arrows choose, Enter opens, Escape leaves. */
export default function Palette({ onClose }: { onClose: () => void }) {
  const dialog = useRef<HTMLDialogElement>(null);
  const id = useId();
  const navigate = useNavigate();
  const [text, setText] = useState("");
  const found = useFound(text);
  const options = optionsOf(found.answer);
  // The choice is of one answer: the next one begins at its first option.
  const [choice, setChoice] = useState<{ of: object | null; at: number }>({ of: null, at: 0 });
  const at = choice.of === found.answer ? Math.min(choice.at, options.length - 1) : 0;
  const chosen = options[at];
  useEffect(() => dialog.current?.showModal(), []);
  useEffect(() => {
    document.getElementById(`${id}-${at}`)?.scrollIntoView({ block: "nearest" });
  }, [id, at]);

  const close = () => dialog.current?.close();
  const open = (path: string) => {
    close();
    void navigate(path);
  };
  const press = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.nativeEvent.isComposing) return;
    const step = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
    if (step !== 0 && options.length > 0) {
      event.preventDefault();
      setChoice({ of: found.answer, at: (at + step + options.length) % options.length });
    }
    if (event.key !== "Enter") return;
    event.preventDefault();
    // An answer to an earlier text is not what somebody who types on has chosen from.
    if (chosen && !found.waiting) open(chosen.path);
    else if (text.trim() !== "") open(`/search?${new URLSearchParams({ q: text.trim() }).toString()}`);
  };
  return (
    <dialog
      ref={dialog}
      aria-label="Search"
      onClose={onClose}
      onClick={(event) => event.target === dialog.current && close()}
      className="frame mx-auto mt-[8vh] mb-auto w-[calc(100%-2rem)] max-w-160 text-ink shadow-float backdrop:bg-ink/30"
    >
      <div className="flex items-center gap-2 border-b border-ink p-2">
        <input
          type="text"
          inputMode="search"
          role="combobox"
          aria-label="Name or number of anything that you may open"
          aria-expanded={options.length > 0}
          aria-controls={options.length > 0 ? `${id}-options` : undefined}
          aria-activedescendant={chosen ? `${id}-${at}` : undefined}
          aria-autocomplete="list"
          autoComplete="off"
          autoCapitalize="none"
          spellCheck={false}
          maxLength={100}
          placeholder="Flow, film, wafer, number, word …"
          value={text}
          onChange={(event) => setText(event.currentTarget.value)}
          onKeyDown={press}
          className="input text-lead"
        />
        <button type="button" className="btn" onClick={close}>
          Close
        </button>
      </div>
      {options.length > 0 && <PaletteOptions id={id} options={options} at={at} onOpen={close} />}
      <PaletteFoot found={found} />
    </dialog>
  );
}

/** What is under way, what came out of it, and how the keys work. */
function PaletteFoot({ found: { answer, waiting, why, again } }: { found: Found }) {
  const query = answer?.query ?? "";
  const empty = answer !== null && answer.groups.length === 0;
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-1 border-t border-line px-4 py-2 text-label text-quiet">
      <p role="status" className={why === null ? "" : "text-stop"}>
        {waiting
          ? "Looking"
          : (why ??
            (empty
              ? query === ""
                ? "Type a part of a name."
                : `${nothingFound(query)}; try fewer letters, or one word alone.`
              : query === ""
                ? ""
                : countFound(answer?.total ?? 0)))}
      </p>
      {why !== null && !waiting && (
        <button type="button" className="link cursor-pointer" onClick={again}>
          Try again
        </button>
      )}
      <p className="ml-auto max-tablet:hidden">Arrows choose, Enter opens, Escape leaves</p>
    </div>
  );
}

import { Link, useFetcher } from "react-router";
import { Swatch } from "#app/components/drawings/Swatch.tsx";
import type { ImportResult } from "#app/lib/scan-import/results.ts";

const LEVELS = { scan: "clear", measured: "clear", waits: "caution", already: null } as const;

/** What came of a file, with a way back until it is used; not while others are on their way, one of which may be its partner. */
export function ImportOutcome({ result, sending }: { result: ImportResult; sending: boolean }) {
  const { outcome, label, path, words, files, undo } = result;
  const fetcher = useFetcher<{ outcome: "undone" | "used"; sentence: string }>();
  const busy = fetcher.state !== "idle";
  const said = busy ? undefined : fetcher.data;
  const isUndone = said?.outcome === "undone";
  const level = isUndone ? null : LEVELS[outcome];
  return (
    <li className="flex gap-3 border-t border-line py-2 first:border-0">
      <span className="mt-0.5 w-[22px] flex-none">{level && <Swatch level={level} />}</span>
      <div className="min-w-0 flex-1 wrap-anywhere">
        <p>
          {path === null || isUndone ? (
            <b className="font-semibold">{label}</b>
          ) : (
            <Link to={path} className="link">
              {label}
            </Link>
          )}
          {isUndone ? "" : ` ${words}`}
          {files.length > 0 && <span className="text-quiet">{`: ${files.join(" and ")}`}</span>}
        </p>
        <p role="status" className="text-quiet empty:hidden">
          {said?.sentence}
        </p>
      </div>
      {undo && !isUndone && (
        <button
          type="button"
          className="link min-h-6 flex-none self-start"
          disabled={busy || sending}
          aria-label={`Undo the import: ${label}`}
          onClick={() => {
            void fetcher.submit(undo, { method: "post", action: "/scans/undo" });
          }}
        >
          {busy ? "Undoing" : "Undo"}
        </button>
      )}
    </li>
  );
}

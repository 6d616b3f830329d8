import { useEffect, useRef } from "react";
import { useBlocker, type Location } from "react-router";

/** Put into a link's `state` when the person has said that what is typed may go. */
export const LEAVE = { leave: true };

const saidSo = ({ state }: Location) =>
  typeof state === "object" && state !== null && "leave" in state && state.leave === true;

/** Asks before unsaved edits are left behind, within the application and when the window closes. */
export function UnsavedGuard({
  dirty,
  stands = "What you changed here is not saved yet.",
}: {
  dirty: boolean;
  /** what becomes of it */
  stands?: string;
}) {
  const dialog = useRef<HTMLDialogElement>(null);
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      dirty && currentLocation.pathname !== nextLocation.pathname && !saidSo(nextLocation),
  );
  const asks = blocker.state === "blocked";
  useEffect(() => {
    if (!dirty) return undefined;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [dirty]);
  useEffect(() => {
    if (asks) dialog.current?.showModal();
    else dialog.current?.close();
  }, [asks]);
  return (
    <dialog
      ref={dialog}
      className="m-auto max-w-120 border border-ink bg-raised p-6 text-ink backdrop:bg-ink/40"
      aria-labelledby="unsaved"
      onCancel={() => blocker.reset?.()}
    >
      <h2 id="unsaved" className="text-lead font-semibold">
        Leave without saving?
      </h2>
      <p className="mt-1">{stands}</p>
      <div className="mt-4 flex flex-wrap gap-2">
        <button type="button" className="btn btn-primary" onClick={() => blocker.reset?.()}>
          Stay here
        </button>
        <button type="button" className="btn btn-remove" onClick={() => blocker.proceed?.()}>
          Leave without saving
        </button>
      </div>
    </dialog>
  );
}

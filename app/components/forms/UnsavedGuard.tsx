import { useEffect } from "react";
import { useBlocker, type Location } from "react-router";
import { Notice } from "#app/components/ui/Notice.tsx";

/** Put into a link's `state` when the person has said that what is typed may go. */
export const LEAVE = { leave: true };

const saidSo = ({ state }: Location) =>
  typeof state === "object" && state !== null && "leave" in state && state.leave === true;

/** Asks before a form that was changed is left: in the page for our own links, by the browser for everything else. */
export function UnsavedGuard({ dirty }: { dirty: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      dirty && currentLocation.pathname !== nextLocation.pathname && !saidSo(nextLocation),
  );
  useEffect(() => {
    if (!dirty) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [dirty]);
  if (blocker.state !== "blocked") return null;
  return (
    <Notice kind="caution" title="What you changed here is not saved yet">
      <div className="flex flex-wrap gap-2">
        <button type="button" className="btn" autoFocus onClick={() => blocker.reset()}>
          Stay and go on
        </button>
        <button type="button" className="btn btn-remove" onClick={() => blocker.proceed()}>
          Leave without saving
        </button>
      </div>
    </Notice>
  );
}

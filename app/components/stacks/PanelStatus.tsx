/** Whether the figures are of what is typed. */
export type Status =
  | { kind: "current" }
  /** on its way */
  | { kind: "asking" }
  /** something is missing or cannot be read */
  | { kind: "waiting"; what: string; more: number; fieldId: string; goTo: () => void }
  | { kind: "problem"; sentence: string; retry: () => void };

/** One line beside the answer; empty while the figures are of what is typed. */
export function PanelStatus({ status }: { status: Status }) {
  return (
    <p className="text-label" role="status">
      {status.kind === "asking" && (
        <span className="text-quiet" aria-hidden>
          Out of date, working it out
        </span>
      )}
      {status.kind === "waiting" && (
        <>
          <b>Out of date</b>, waiting for{" "}
          <a
            href={`#${status.fieldId}`}
            className="link"
            onClick={(event) => {
              event.preventDefault();
              status.goTo();
            }}
          >
            {status.what}
          </a>
          {status.more > 0 && ` and ${status.more} more`}
        </>
      )}
      {status.kind === "problem" && (
        <>
          <b>Out of date.</b> {status.sentence}{" "}
          <button type="button" className="link cursor-pointer" onClick={status.retry}>
            Try again
          </button>
        </>
      )}
    </p>
  );
}

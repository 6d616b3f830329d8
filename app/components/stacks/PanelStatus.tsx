/** Whether the figures are of what is typed. */
export type Status =
  | { kind: "current" }
  /** on its way */
  | { kind: "asking" }
  /** something is missing or cannot be read */
  | { kind: "waiting"; what: string; more: number; fieldId: string; goTo: () => void }
  | { kind: "problem"; sentence: string; retry: () => void };

interface Props {
  status: Status;
  /** whether there are no figures yet, so that none can be out of date */
  before?: boolean;
}

/** One line beside the answer; empty while the figures are of what is typed. */
export function PanelStatus({ status, before = false }: Props) {
  return (
    <p className="text-label" role="status">
      {status.kind === "asking" && (
        <span className="text-quiet" aria-hidden>
          {before ? "Working it out" : "Out of date, working it out"}
        </span>
      )}
      {status.kind === "waiting" && (
        <>
          {before ? (
            "Waiting for "
          ) : (
            <>
              <b>Out of date</b>, waiting for{" "}
            </>
          )}
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
          {!before && <b>Out of date. </b>}
          {status.sentence}{" "}
          <button type="button" className="link cursor-pointer" onClick={status.retry}>
            Try again
          </button>
        </>
      )}
    </p>
  );
}

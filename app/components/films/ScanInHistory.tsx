import { Link } from "react-router";
import type { AcceptedAs } from "#app/schemas/accept-scan.ts";

interface Props {
  scanId: string;
  /** null for a scan of no film */
  accepted: AcceptedAs | null;
  curled: boolean;
}

/** Where a scan stands in its film's history, and the way into it for who may go it. */
export function ScanInHistory({ scanId, accepted, curled }: Props) {
  return (
    <section
      aria-labelledby="film-history"
      className="frame mt-4 flex flex-wrap items-center gap-x-6 gap-y-2 p-4 tablet:px-6"
    >
      <h2 id="film-history" className="font-semibold">
        Film’s history
      </h2>
      <Standing accepted={accepted} curled={curled} />
      {accepted?.mayAccept && !accepted.value && !curled && (
        <Link to={`/scans/${scanId}/accept`} className="btn screen-only ml-auto">
          Accept into the history
        </Link>
      )}
    </section>
  );
}

function Standing({ accepted, curled }: Pick<Props, "accepted" | "curled">) {
  if (!accepted) return <p className="text-quiet">No film of the library is named, so it goes into no history.</p>;
  const { film, value, mayAccept } = accepted;
  const link = (
    <Link to={`/films/${(value?.film ?? film).id}#history`} className="link">
      {(value?.film ?? film).name}
    </Link>
  );
  if (value)
    return (
      <p>
        Accepted into the history of {link} on {value.at.slice(0, 10)} by {value.by}
        {value.state === "set aside" ? "; it is set aside there and does not count." : "; it counts."}
      </p>
    );
  if (curled) return <p className="text-quiet">It gives no stress, so it cannot go into the history of {link}.</p>;
  return (
    <p>
      Not accepted into the history of {link}
      {mayAccept ? "." : ". An engineer or process owner of the program may accept it."}
    </p>
  );
}

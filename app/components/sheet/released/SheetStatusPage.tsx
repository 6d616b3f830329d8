import { Link } from "react-router";
import { PublicCard } from "#app/components/layout/PublicCard.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import { statusPath } from "#app/lib/status-path.ts";
import type { SheetStatus } from "#app/schemas/sheet-view.ts";

interface Props {
  status: SheetStatus | null;
  /** ISO date-time of the answer */
  now: string;
}

/** What a scanned paper leads to: first, in large words, whether it may be worked from. */
export function SheetStatusPage({ status, now }: Props) {
  const { good, word, lines } = answerOf(status, now);
  return (
    <PublicCard>
      <div className={`border-l-4 p-6 ${good ? "border-clear" : "border-stop"}`}>
        <p className="text-quiet">
          {status ? `Handling-risk sheet ${status.sheet} ${status.letter}` : "Handling-risk sheet"}
        </p>
        <h1 className={`mt-1 text-answer font-semibold ${good ? "text-clear" : "text-stop"}`}>{word}</h1>
        {lines.map((line) => (
          <p key={line} className="mt-2">
            {line}
          </p>
        ))}
        {status?.current && (
          <p className="mt-2">
            <Link to={statusPath(status.current)} className="link">
              See the revision in force
            </Link>
          </p>
        )}
        <p className="mt-4 text-label text-quiet">Asked at {minuteOf(now)}.</p>
        {status && (
          <p className="mt-1">
            <Link to={`/sheets?q=${encodeURIComponent(status.sheet)}`} className="link">
              Open the sheet
            </Link>{" "}
            <span className="text-quiet">(signed in)</span>
          </p>
        )}
      </div>
    </PublicCard>
  );
}

const STOP = "Do not work from this paper. Stop, and ask the shift lead.";

function answerOf(status: SheetStatus | null, now: string): { good: boolean; word: string; lines: string[] } {
  if (status === null)
    return {
      good: false,
      word: "Not known here",
      lines: ["No sheet was ever released with this code.", STOP],
    };
  const { state, supersededBy, endedAt, releasedAt, deviationUntil } = status;
  const ended = endedAt === null ? [] : [`Since ${minuteOf(endedAt)}.`];
  if (state === "superseded")
    return {
      good: false,
      word: supersededBy ? `Superseded by ${supersededBy}` : "Superseded",
      lines: [...ended, STOP],
    };
  if (state === "withdrawn") return { good: false, word: "Withdrawn", lines: [...ended, STOP] };
  const since = `In force since ${minuteOf(releasedAt)}.`;
  if (deviationUntil === null) return { good: true, word: "Current", lines: [since] };
  if (deviationUntil <= now)
    return { good: false, word: "Deviation over", lines: [`It ended at ${minuteOf(deviationUntil)}.`, STOP] };
  return {
    good: true,
    word: `Current, deviation until ${deviationUntil.slice(0, 10)}`,
    lines: [since, `Its deviation counts until ${minuteOf(deviationUntil)}, within the scope that its paper says.`],
  };
}

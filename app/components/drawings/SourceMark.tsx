import type { SourceKind } from "#app/engine/vocabulary.ts";
import { colour } from "./colour.ts";

export interface SourceMarkProps {
  kind: SourceKind;
  /** Leaves the word out where the column says it already; `assumed` keeps it always. */
  markOnly?: boolean;
}

/**
 * Where a value comes from: filled square measured here, half-filled supplier, open handbook, dashed assumed.
 * An assumed value is also said in words and in the colour of a caution.
 */
export function SourceMark({ kind, markOnly = false }: SourceMarkProps) {
  const assumed = kind === "assumed";
  const wordless = markOnly && !assumed;
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <svg
        width="12"
        height="12"
        role={wordless ? "img" : undefined}
        aria-label={wordless ? kind : undefined}
        aria-hidden={!wordless}
      >
        <rect
          x="1"
          y="1"
          width="10"
          height="10"
          fill={kind === "measured here" ? colour("ink") : "none"}
          stroke={colour(assumed ? "caution" : "ink")}
          strokeWidth={assumed ? 1.4 : 1}
          strokeDasharray={assumed ? "2.4 2" : undefined}
        />
        {kind === "supplier" ? <path d="M1 11L11 1V11Z" fill={colour("ink")} /> : null}
      </svg>
      {wordless ? null : <span className={assumed ? "font-semibold text-caution" : ""}>{kind}</span>}
    </span>
  );
}

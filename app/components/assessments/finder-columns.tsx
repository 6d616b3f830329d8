import type { ReactNode } from "react";
import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { tightestWords } from "#app/lib/finder-rows.ts";
import { trialHome } from "#app/lib/leg-query.ts";
import { triedPath } from "#app/lib/tried-path.ts";
import type { FinderRow } from "#app/schemas/finder.ts";
import type { TrialHead } from "#app/schemas/trial.ts";
import { TryOnCopy } from "./TryOnCopy.tsx";
import { WorkingLink } from "./WorkingLink.tsx";

/** Thickness in µm as the list shows it. */
const micrometres = (thickness: number) => String(Number((thickness * 1e6).toPrecision(4)));

/** Rounded first: what rounds to nothing has no sign. */
function percent(margin: number): string {
  const whole = Math.round(margin * 100);
  return `${whole < 0 ? "−" : ""}${Math.abs(whole)} %`;
}

/** Columns of the finder. On a phone the bond stands under its carrier. */
export function finderColumns(head: TrialHead): Column<FinderRow>[] {
  return [
    {
      key: "carrier",
      head: "Carrier",
      sortable: true,
      cell: ({ carrier, material, thickness, planned, fits, margin }) => (
        <>
          {noBreak(carrier)}
          {planned ? <span className="text-quiet">, as planned</span> : null}
          <span className="block text-quiet tablet:hidden">
            {noBreak(material)}, {micrometres(thickness)}&nbsp;µm
            {fits && margin !== null ? `; margin ${percent(margin)}` : null}
          </span>
        </>
      ),
    },
    {
      key: "material",
      head: "Bonding material",
      sortable: true,
      wide: true,
      cell: ({ material, release }) => (
        <>
          {noBreak(material)}
          <span className="block text-label text-quiet">{release}</span>
        </>
      ),
    },
    {
      key: "thickness",
      head: "Thickness",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ thickness }) => micrometres(thickness),
    },
    {
      key: "margin",
      head: "Margin",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ margin, fits }) => (fits && margin !== null ? percent(margin) : ""),
    },
    { key: "finding", head: "Finding", cell: (row) => <FinderFinding row={row} head={head} /> },
  ];
}

/** How it came out, and for what fits the way to try it. */
function FinderFinding({ row, head }: { row: FinderRow; head: TrialHead }) {
  const { fits, outcome, tightest, reason, posted, carrier, material, thickness } = row;
  const working = <RowWorking row={row} head={head} />;
  if (!fits && reason) return <Misfit outcome={outcome} reason={reason} head={head} working={working} />;
  return (
    <div className="tablet:flex tablet:items-center tablet:justify-between tablet:gap-4">
      <FindingTag outcome={outcome} word={outcome === "clear" ? "Fits" : "Fits, with cautions"}>
        {tightest ? `tightest at ${tightestWords(tightest)}` : undefined} {working}
      </FindingTag>
      {posted !== null && head.barred === null ? (
        <TryOnCopy head={head} posted={posted} name={`${carrier}, ${material}, ${micrometres(thickness)} µm`} />
      ) : null}
    </div>
  );
}

/** To the figures behind a row, before and after; what is planned already has its own in the assessment. */
function RowWorking({
  row: { posted, tightest, reason, carrier, material },
  head,
}: {
  row: FinderRow;
  head: TrialHead;
}) {
  const { step, rule } = reason ?? tightest ?? { step: 0, rule: null };
  const at = rule === null ? null : { step, rule };
  const path = posted === null ? null : triedPath(head, posted, at);
  return <WorkingLink path={path} of={`${carrier}, ${material}`} />;
}

interface MisfitProps {
  outcome: FinderRow["outcome"];
  reason: NonNullable<FinderRow["reason"]>;
  head: TrialHead;
  working: ReactNode;
}

function Misfit({ outcome, reason: { step, rule, text }, head, working }: MisfitProps) {
  const missed = rule === null && outcome !== "cannot judge";
  return (
    <>
      <FindingTag outcome={missed ? "do not run" : outcome} {...(missed ? { word: "Misses the target" } : {})}>
        <Link to={trialHome(head, step)} className="link">
          step {step}
        </Link>
        {rule === null ? "" : `, rule ${rule}`}
      </FindingTag>
      <span className="mt-0.5 block">
        {noBreak(text)} {working}
      </span>
    </>
  );
}

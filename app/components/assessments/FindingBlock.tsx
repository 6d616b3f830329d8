import { Fragment } from "react";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { FindingView } from "#app/lib/assessment-finding.ts";
import { DetailList } from "./DetailList.tsx";
import { WorkingLink } from "./WorkingLink.tsx";

/** One finding, whole: why, its figures with their workings, the limit with its source, and what would clear it. */
export function FindingBlock({ finding }: { finding: FindingView }) {
  const { rule, title, outcome, reason, figures, limit, remedy } = finding;
  return (
    <div>
      <FindingTag outcome={outcome}>
        rule {rule}, {title.charAt(0).toLowerCase() + title.slice(1)}
      </FindingTag>
      <DetailList>
        <dt>Why</dt>
        <dd>{noBreak(reason)}</dd>
        {figures.length > 0 ? (
          <>
            <dt>Figures</dt>
            <dd>
              {figures.map(({ label, value, working }, index) => (
                <Fragment key={label}>
                  {index > 0 ? "; " : ""}
                  {label} <span className="font-medium whitespace-nowrap">{value}</span>
                  {working === null ? null : " "}
                  <WorkingLink path={working} of={label} />
                </Fragment>
              ))}
            </dd>
          </>
        ) : null}
        {limit === null ? null : (
          <>
            <dt>Limit</dt>
            <dd>{noBreak(limit)}</dd>
          </>
        )}
        {remedy === null ? null : (
          <>
            <dt>Clears with</dt>
            <dd>{noBreak(remedy)}</dd>
          </>
        )}
      </DetailList>
    </div>
  );
}

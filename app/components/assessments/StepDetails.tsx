import { noBreak } from "#app/components/drawings/no-break.ts";
import { ProfileDrawing } from "#app/components/drawings/ProfileDrawing.tsx";
import type { SelectedStep, ShapeLine } from "#app/lib/assessment-selected.ts";
import { DetailList } from "./DetailList.tsx";
import { FindingBlock } from "./FindingBlock.tsx";
import { WorkingLink } from "./WorkingLink.tsx";

/** The selected step in full: what is not clear first, then the shapes, then the findings that are clear, folded away. */
export function StepDetails({ step }: { step: SelectedStep }) {
  const { open, clear, lies, peak, released, run, profile, remarks } = step;
  return (
    <div className="space-y-3">
      {open.map((finding) => (
        <FindingBlock key={finding.index} finding={finding} />
      ))}
      <DetailList>
        <Shape term="Lies as" line={lies} />
        {peak ? <Shape term="When hot" line={peak} /> : null}
        {released ? <Shape term="If let go" line={released} /> : null}
        {run ? (
          <>
            <dt>Run on</dt>
            <dd>{noBreak(run)}</dd>
          </>
        ) : null}
        {profile ? (
          <>
            <dt>Profile</dt>
            <dd>
              <p className="mb-2">{profile.words}</p>
              <ProfileDrawing profile={profile.points} label={`Temperature profile: ${profile.words}`} />
            </dd>
          </>
        ) : null}
        {remarks.length > 0 ? (
          <>
            <dt>Rests on</dt>
            <dd>
              <ul>
                {remarks.map((remark) => (
                  <li key={remark}>{noBreak(remark)}</li>
                ))}
              </ul>
            </dd>
          </>
        ) : null}
      </DetailList>
      {clear.length > 0 ? (
        <details>
          <summary className="link w-fit cursor-pointer">
            {clear.length === 1 ? "1 clear finding" : `${clear.length} clear findings`}
          </summary>
          <div className="mt-2 space-y-3">
            {clear.map((finding) => (
              <FindingBlock key={finding.index} finding={finding} />
            ))}
          </div>
        </details>
      ) : null}
    </div>
  );
}

function Shape({ term, line }: { term: string; line: ShapeLine }) {
  return (
    <>
      <dt>{term}</dt>
      <dd>
        {noBreak(line.text)} <WorkingLink path={line.working} of={term.toLowerCase()} />
      </dd>
    </>
  );
}

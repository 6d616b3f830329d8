import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import type { Option } from "#app/components/ui/SelectField.tsx";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { reachSentence } from "#app/lib/change-reach-words.ts";
import type { ChangeFormView } from "#app/lib/change-request-form.ts";
import { movementSentence } from "#app/lib/out-of-date-words.ts";
import type { ChangeReach, TouchedFlow } from "#app/schemas/change-request.ts";
import { ChangeRequestForm } from "./ChangeRequestForm.tsx";
import { ChangeTable } from "./ChangeTable.tsx";
import { ComparisonTable } from "./ComparisonTable.tsx";

interface Props {
  form: ChangeFormView;
  reach: ChangeReach | null;
  programs: readonly Option[];
}

/** What a change would do: which flows it touches, and by how much. Nothing is stored. */
export function ChangeRequestPage({ form, reach, programs }: Props) {
  return (
    <>
      <PageHead title="What would change?" crumbs={[{ name: "Flows", path: "/flows" }]} />
      <ChangeRequestForm form={form} programs={programs} />
      {reach && form.question ? (
        <Reach question={form.question} reach={reach} form={form} />
      ) : (
        <p className="max-w-160 text-quiet">
          Say what is going to change, such as a cure that goes from 230 to 200&nbsp;°C or a film’s stress from 31 to
          35&nbsp;MPa. Every flow of your programs is computed with it and without it. Nothing is stored.
        </p>
      )}
    </>
  );
}

function Reach({ question, reach, form }: { question: string; reach: ChangeReach; form: ChangeFormView }) {
  const { touched, more } = reach;
  const slugs = [...new Map(touched.map(({ program }) => [program.slug, program.name]))];
  return (
    <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
      <section className="p-4 tablet:p-6" aria-label="Answer">
        <p className="text-quiet">{noBreak(question)}</p>
        <h2 className="mt-1 text-figure font-medium text-pretty tablet:text-answer">{reachSentence(reach)}</h2>
        <p className="mt-2 text-quiet">Computed now, on everything else as it is. Nothing is stored.</p>
        {slugs.length > 0 ? (
          <p className="screen-only mt-3 flex flex-wrap gap-x-4 gap-y-1">
            {slugs.map(([slug, name]) => (
              <Link key={slug} to={`/assessments/change-request/print?${printSearch(form, slug)}`} className="link">
                Page for the customer of {name}
              </Link>
            ))}
          </p>
        ) : null}
      </section>
      {touched.map((flow) => (
        <Touched key={flow.id} flow={flow} />
      ))}
      {more > 0 ? (
        <p className="border-t border-ink p-4 font-semibold tablet:px-6">
          {more} more {more === 1 ? "flow uses" : "flows use"} it and {more === 1 ? "was" : "were"} not computed. Choose
          a program to see fewer at once.
        </p>
      ) : null}
    </article>
  );
}

function printSearch({ fields }: ChangeFormView, program: string): string {
  return new URLSearchParams({ ...fields, program }).toString();
}

function Touched({ flow }: { flow: TouchedFlow }) {
  const { id, name, program, newest, movement, changes } = flow;
  const moved = movement.outcome === "computed" ? movement.moved : [];
  return (
    <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby={`flow-${id}`}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
        <h3 id={`flow-${id}`} className="font-semibold">
          <Link to={`/flows/${id}`} className="link">
            {name}
          </Link>
        </h3>
        <p className="text-quiet">
          {program.name},{" "}
          {newest ? (
            <>
              <Link to={`/assessments/${newest.id}`} className="link">
                revision {revisionLetters(newest.number)}
              </Link>
              , {newest.createdAt.slice(0, 10)}
            </>
          ) : (
            "not assessed yet"
          )}
        </p>
      </div>
      {movement.outcome === "computed" ? (
        <p className="mt-1 flex flex-wrap items-center gap-x-2">
          <span className="text-quiet">now</span> <FindingTag outcome={movement.before.outcome} />
          <span className="text-quiet">then</span>{" "}
          <FindingTag outcome={movement.after.outcome}>{movement.after.where}</FindingTag>
        </p>
      ) : null}
      <p className="mt-1 max-w-[70em]">{noBreak(movementSentence(movement))}</p>
      <details className="mt-2">
        <summary className="link w-fit cursor-pointer">
          Details<span className="sr-only"> of {name}</span>
        </summary>
        <ChangeTable changes={changes} caption={`What changes in ${name}`} heads={{ from: "Now", to: "Then" }} />
        {moved.length > 0 ? (
          <ComparisonTable rows={moved} before="Now" after="Then" caption={`Steps of ${name} that change`} />
        ) : null}
      </details>
    </section>
  );
}

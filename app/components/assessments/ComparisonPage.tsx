import { Link } from "react-router";
import { CourseChart } from "#app/components/charts/CourseChart.tsx";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import type { ComparisonHalf, ComparisonView } from "#app/lib/comparison-view.ts";
import { lyingText } from "#app/lib/course-words.ts";
import { stepNumbers } from "#app/lib/step-numbers.ts";
import { ChangeTable } from "./ChangeTable.tsx";
import { ComparisonChoice } from "./ComparisonChoice.tsx";
import { ComparisonTable } from "./ComparisonTable.tsx";

/** Two assessments side by side: both answers, what differs in their inputs, the steps aligned, and both courses. */
export function ComparisonPage({ view, query }: { view: ComparisonView; query: string }) {
  const { asked, chosen } = view;
  return (
    <>
      <PageHead
        title={chosen ? `${chosen.before.name} and ${chosen.after.name}` : "Compare"}
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: asked.flow.name, path: `/flows/${asked.flow.id}` },
          { name: `Assessment, ${asked.name}`, path: `/assessments/${asked.id}` },
        ]}
      />
      <ComparisonChoice view={view} query={query} />
      {chosen ? (
        <Compared chosen={chosen} />
      ) : (
        <EmptyState
          title="Nothing to compare with yet"
          actions={
            <Link to={`/assessments/${asked.id}`} className="btn">
              Back to the assessment
            </Link>
          }
        >
          {view.otherFlows.length > 0
            ? "This flow has one assessment only. Choose one of another flow of the program above."
            : "Change the flow and assess it again, or assess another flow of the program: both then stand here side by side."}
        </EmptyState>
      )}
    </>
  );
}

function Compared({ chosen }: { chosen: NonNullable<ComparisonView["chosen"]> }) {
  const { before, after, sentence, changes, engine, rows, course } = chosen;
  const drawn = [...course.before, ...course.after].some(Boolean);
  return (
    <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
      <div className="grid tablet:grid-cols-2">
        <Half half={before} />
        <Half half={after} second />
      </div>
      <p className="border-t border-ink p-4 font-semibold tablet:px-6">{noBreak(sentence)}</p>
      <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby="inputs">
        <h2 id="inputs" className="font-semibold">
          What differs in the inputs
        </h2>
        {engine ? (
          <p className="mt-1">
            Engine {engine.from}, then {engine.to}.
          </p>
        ) : null}
        {changes.length > 0 ? (
          <ChangeTable changes={changes} caption="Inputs that differ" heads={{ from: before.name, to: after.name }} />
        ) : (
          <p className="mt-1 text-quiet">Nothing: both rest on the same values.</p>
        )}
      </section>
      <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby="steps">
        <h2 id="steps" className="font-semibold">
          Steps
        </h2>
        <ComparisonTable rows={rows} before={before.name} after={after.name} caption="Steps side by side" />
      </section>
      {drawn ? (
        <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby="course">
          <h2 id="course" className="mb-2 font-semibold">
            Warp along the flow at 25&nbsp;°C
          </h2>
          <CourseChart
            data={{
              places: course.places,
              lines: [
                {
                  id: "before",
                  label: shortened(before.name),
                  dash: "long",
                  marker: "square",
                  colourToken: "copper",
                  values: course.before,
                },
                {
                  id: "after",
                  label: shortened(after.name),
                  dash: "solid",
                  marker: "circle",
                  colourToken: "silicon",
                  values: course.after,
                },
              ],
              limits: course.limits,
              rolled: course.rolled,
              formatWarp: lyingText,
            }}
            label={`Warp along the flow at 25 °C, ${before.name} and ${after.name}`}
            summary={`As it lies on each tool. Short dashes: what the tools of ${after.name} take; those far beyond the wafer are left off.${
              course.rolled.length > 0 ? ` Ruled: one of the two rolls up, at place ${stepNumbers(course.rolled)}.` : ""
            }`}
          />
        </section>
      ) : null}
    </article>
  );
}

const LONGEST = 22;
const shortened = (name: string) => (name.length <= LONGEST ? name : `${name.slice(0, LONGEST - 1).trimEnd()}…`);

function Half({ half, second = false }: { half: ComparisonHalf; second?: boolean }) {
  const { id, name, document, outcome, where, sentences } = half;
  return (
    <section
      className={`p-4 tablet:p-6 ${second ? "border-ink max-tablet:border-t tablet:border-l" : ""}`}
      aria-label={name}
    >
      <p className="text-quiet">
        <Link to={`/assessments/${id}`} className="link">
          {name}
        </Link>
        , {document}
      </p>
      <p className="mt-2">
        <FindingTag outcome={outcome}>{where}</FindingTag>
      </p>
      <h2 className="mt-1 text-lead font-medium text-pretty">
        {sentences.map((sentence) => (
          <span key={sentence} className="block">
            {noBreak(sentence)}{" "}
          </span>
        ))}
      </h2>
    </section>
  );
}

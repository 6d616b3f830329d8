import { Link } from "react-router";
import { AnswerLine, type AnswerFigure } from "#app/components/drawings/AnswerLine.tsx";
import type { InstrumentDetail, StudyView } from "#app/schemas/instrument.ts";
import { profileWords } from "./profile-words.ts";
import { ReferenceSection } from "./ReferenceSection.tsx";
import { repeatabilityOfBow, repeatabilityText } from "./repeatability-text.ts";
import { StudySection } from "./StudySection.tsx";

/** What is known of an instrument: how well it repeats, and what it reads on wafers of known bow. */
export function InstrumentView({ instrument }: { instrument: InstrumentDetail }) {
  const { name, studies, inUse, references, mayCheck, profile } = instrument;
  const study = studies.find(({ id }) => id === inUse) ?? null;
  return (
    <div className="frame">
      <AnswerLine figuresBelow level={2} sentences={answerOf(name, study)} figures={figuresOf(study, instrument)} />
      <section className="border-t border-ink p-4 tablet:p-6" aria-labelledby="studies">
        <SectionHead
          id="studies"
          title="Repeatability"
          to={mayCheck ? "study" : null}
          action="New study"
          about="One wafer, measured again and again, taken off and put back between. Budgets of film stress use the newest study that counts."
        />
        {studies.length === 0 ? (
          <p className="text-quiet">
            No study yet. Until there is one, budgets hold the scatter of the points alone and say so.
          </p>
        ) : (
          studies.map((each) => (
            <StudySection key={each.id} study={each} inUse={each.id === inUse} mayCheck={mayCheck} />
          ))
        )}
      </section>
      <section className="border-t border-ink p-4 tablet:p-6" aria-labelledby="references">
        <SectionHead
          id="references"
          title="Wafers of known bow"
          to={mayCheck ? "reference" : null}
          action="New reading"
          about="A wafer whose bow is known, read from time to time, shows whether the instrument is off and whether it drifts."
        />
        {references.length === 0 ? (
          <p className="text-quiet">None has been read on it yet.</p>
        ) : (
          references.map((reference) => (
            <ReferenceSection key={reference.wafer.id} reference={reference} mayCheck={mayCheck} />
          ))
        )}
      </section>
      <section className="border-t border-ink p-4 tablet:p-6" aria-labelledby="files">
        <h2 id="files" className="font-semibold">
          How it writes its files
        </h2>
        <p className="mt-1 max-w-[60em]">{profileWords(profile)}</p>
      </section>
    </div>
  );
}

function SectionHead(props: { id: string; title: string; about: string; to: string | null; action: string }) {
  const { id, title, about, to, action } = props;
  return (
    <div className="mb-3 flex flex-wrap items-start gap-x-6 gap-y-2">
      <div className="min-w-0 flex-1 basis-80">
        <h2 id={id} className="text-lead font-semibold">
          {title}
        </h2>
        <p className="max-w-[60em] text-quiet">{about}</p>
      </div>
      {to && (
        <Link to={to} className="btn screen-only">
          {action}
        </Link>
      )}
    </div>
  );
}

function answerOf(name: string, study: StudyView | null): string[] {
  if (!study)
    return [`${name}: how well it repeats is not known.`, "Study one wafer on it before its stresses are accepted."];
  return [`${name}: a curvature repeats within ${repeatabilityText(study.result.forTwo)}.`];
}

function figuresOf(study: StudyView | null, { references }: InstrumentDetail): AnswerFigure[] {
  const readings = references.flatMap(({ readings: all }) => all);
  const newest = readings
    .map(({ measuredOn }) => measuredOn)
    .sort()
    .at(-1);
  const quiet = (text: string) => <span className="text-quiet">{text}</span>;
  const about = study
    ? [
        {
          label: "Repeatability of a curvature, k = 2",
          value: repeatabilityText(study.result.forTwo),
          working: (
            <a href={`#study-${study.id}`} className="link">
              Working
            </a>
          ),
        },
        {
          label: "The same as a bow, k = 2",
          value: repeatabilityOfBow(study.result.forTwo, study.diameter),
          working: quiet(`over ${Math.round(study.diameter * 1000)} mm`),
        },
        {
          label: "Repeats in the study",
          value: String(study.readings.length),
          working: quiet(`${study.createdAt.slice(0, 10)}, ${study.createdBy}`),
        },
      ]
    : [{ label: "Repeatability", value: "not known", working: quiet("no study counts") }];
  return [
    ...about,
    {
      label: "Reference wafer last read",
      value: newest ?? "never",
      working: quiet(readings.length === 1 ? "1 reading" : `${readings.length} readings`),
    },
  ];
}

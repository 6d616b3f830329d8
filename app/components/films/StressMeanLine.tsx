import { Form, useNavigation } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { libraryStress, meanSentence, toleranceWords } from "#app/lib/stress-words.ts";
import type { FilmStressHistory } from "#app/schemas/film-stress.ts";

/** The mean of the values that count, whether the film uses it, and the press that puts it into use. */
export function StressMeanLine({ history }: { history: FilmStressHistory }) {
  const { mean, usesMean, film, mayEdit, meanWorking } = history;
  if (!mean)
    return <p className="p-4 tablet:px-6">Every value is set aside, so there is no mean. The value in use stays.</p>;
  return (
    <div className="p-4 tablet:px-6">
      <p className="max-w-[44em] text-figure font-medium text-pretty">
        {noBreak(
          usesMean
            ? `In use: the mean of the accepted values, ${libraryStress(mean.stress)}. It follows each value that is accepted or set aside.`
            : `Mean of the accepted values: ${libraryStress(mean.stress)}. It is not in use.`,
        )}
      </p>
      <p className="mt-1 max-w-[60em] text-quiet">{noBreak(`${meanSentence(mean)} ${toleranceWords(mean)}`)}</p>
      {mayEdit && !usesMean && <UseMean version={film.version} count={mean.count} />}
      {meanWorking && (
        <details className="screen-only mt-2">
          <summary className="link w-fit cursor-pointer">Working of the mean</summary>
          <div className="mt-2 max-w-[60em]">
            <WorkingView working={meanWorking} level={3} />
          </div>
        </details>
      )}
    </div>
  );
}

function UseMean({ version, count }: { version: number; count: number }) {
  const { state, formData } = useNavigation();
  const waiting = state !== "idle" && formData?.get("intent") === "use mean";
  return (
    <Form method="post" preventScrollReset className="screen-only mt-3 flex flex-wrap items-center gap-3">
      <input type="hidden" name="version" value={version} />
      <button type="submit" name="intent" value="use mean" className="btn" disabled={waiting}>
        {waiting ? "Saving" : count === 1 ? "Use the accepted value" : `Use the mean of ${count} accepted values`}
      </button>
      <span className="text-quiet">Assessments that used the old value then say so, and by how much they move.</span>
    </Form>
  );
}

import { noBreak } from "#app/components/drawings/no-break.ts";
import { stepNumbers } from "#app/lib/step-numbers.ts";
import type { DatedChange, InputChange } from "#app/schemas/assessment-changes.ts";

interface Props {
  changes: readonly (InputChange & Partial<Pick<DatedChange, "by" | "at">>)[];
  caption: string;
  heads?: { from: string; to: string };
}

/** Inputs that differ: whose, which property, from what to what, at which steps, and who saved it where that is known. */
export function ChangeTable({ changes, caption, heads = { from: "Was", to: "Is now" } }: Props) {
  const dated = changes.some(({ at }) => at);
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">Input</th>
            <th scope="col">{heads.from}</th>
            <th scope="col">{heads.to}</th>
            <th scope="col">Steps</th>
            {dated ? <th scope="col">Saved by</th> : null}
          </tr>
        </thead>
        <tbody>
          {changes.map(({ subject, property, from, to, steps, by, at }) => (
            <tr key={`${subject} ${property} ${from} ${to} ${steps.join(" ")}`}>
              <th scope="row" className="min-w-40 font-normal">
                {noBreak(subject)}
                <span className="block text-label text-quiet">{property}</span>
              </th>
              <td className="min-w-24">{noBreak(from)}</td>
              <td className="min-w-24 font-medium">{noBreak(to)}</td>
              <td>{steps.length === 0 ? "all" : stepNumbers(steps)}</td>
              {dated ? (
                <td className="min-w-32">
                  {by ?? "not known"}
                  {at ? (
                    <span className="block text-label text-quiet">{at.slice(0, 16).replace("T", " ")} UTC</span>
                  ) : null}
                </td>
              ) : null}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

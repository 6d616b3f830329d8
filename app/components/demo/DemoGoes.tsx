import type { ReactNode } from "react";
import { TodaySection } from "#app/components/today/TodaySection.tsx";
import { count } from "#app/lib/count-words.ts";
import type { DemoHere, DemoNames } from "#app/schemas/demo.ts";

/** What goes with the demo, kind by kind; what people have put into it, by name; and what stays. */
export function DemoGoes({ view }: { view: DemoHere }) {
  const { programs, goes, added, changed, kept, keptStresses } = view;
  return (
    <>
      <TodaySection title="Goes" remark={`with ${listed(programs)}`}>
        <dl className="grid grid-cols-[repeat(auto-fill,minmax(168px,1fr))] gap-x-6 gap-y-1">
          {goes.map(({ kind, total }) => (
            <div key={kind} className="flex gap-2">
              <dd className="num min-w-8 font-semibold">{total}</dd>
              <dt>{kind}</dt>
            </div>
          ))}
        </dl>
        <p className="mt-2 text-quiet">With all that is in them: layers, steps, readings of files and revisions.</p>
      </TodaySection>
      <TodaySection title="Added since" remark="by people; it goes too">
        <Names names={added} nobody="Nobody has added anything to the demo." />
      </TodaySection>
      <TodaySection title="Changed since" remark="by people; it goes too">
        <Names names={changed} nobody="Nobody has changed anything of the demo." />
      </TodaySection>
      <TodaySection title="Stays">
        <ul className="space-y-1">
          <li>Every program, film, carrier and template of your own, and everything in your own programs.</li>
          {kept.map(({ kind, name }) => (
            <li key={`${kind} ${name}`}>
              <b>{name}</b>, a {kind} of the demo: something outside the demo uses it. It stays as one of yours.
            </li>
          ))}
          {keptStresses > 0 && (
            <li>
              {said(keptStresses, "stress that was", "stresses that were")} accepted from scans of the demo into films
              that stay, as figures without their scans.
            </li>
          )}
          <li>Every account: whoever can sign in now still can, with the same password.</li>
          <li>The audit trail: what was done in the demo, and that you removed it.</li>
        </ul>
      </TodaySection>
    </>
  );
}

const said = (number: number, one: string, many: string): ReactNode => {
  const words = count(number);
  return `${words.charAt(0).toUpperCase()}${words.slice(1)} ${number === 1 ? one : many}`;
};

const listed = (names: readonly string[]) =>
  names.length < 2 ? names.join("") : `${names.slice(0, -1).join(", ")} and ${names.at(-1)}`;

function Names({ names: { rows, total }, nobody }: { names: DemoNames; nobody: string }) {
  if (total === 0) return <p className="text-quiet">{nobody}</p>;
  return (
    <>
      <ul>
        {rows.map(({ kind, name, by, at }, index) => (
          <li key={index} className="flex flex-wrap justify-between gap-x-4 border-b border-line py-1">
            <span>
              <b>{name}</b> <span className="text-quiet">{kind}</span>
            </span>
            <span className="text-quiet">
              {by ?? "Planeward"}, {at.slice(0, 10)}
            </span>
          </li>
        ))}
      </ul>
      {total > rows.length && <p className="mt-2">and {total - rows.length} more</p>}
    </>
  );
}

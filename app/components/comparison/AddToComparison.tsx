import { useState } from "react";
import { Form, Link } from "react-router";
import { comparisonSearch, LEAST_COMPARED, MOST_COMPARED, type ComparisonAsked } from "#app/lib/comparison/asked.ts";
import type { ComparedKind } from "#app/lib/comparison/kinds.ts";
import { count } from "#app/lib/count-words.ts";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { ComparisonChoice } from "#app/schemas/comparison.ts";
import { HiddenAsked } from "./HiddenAsked.tsx";

interface Props {
  kind: ComparedKind;
  asked: ComparisonAsked;
  choices: readonly ComparisonChoice[];
  /** how many are chosen already */
  chosen: number;
}

/** As many as are in sight at once. */
const SHOWN = 6;

/** What may be added, unfolded while there is nothing to compare yet. */
export function AddToComparison({ kind, asked, choices, chosen }: Props) {
  return (
    <details
      className="screen-only border-t border-line px-4 py-3 tablet:px-6"
      open={chosen < LEAST_COMPARED || asked.query !== ""}
    >
      <summary className="w-fit cursor-pointer">
        <h2 className="link inline font-semibold">Add a {kind.one}</h2>
      </summary>
      {chosen >= MOST_COMPARED ? (
        <p className="mt-1 text-quiet">
          A comparison holds {count(MOST_COMPARED)} {kind.many} at most. Remove one to add another.
        </p>
      ) : (
        <Choices kind={kind} asked={asked} choices={choices} />
      )}
    </details>
  );
}

/** Searched while it is typed, by the server where there are no scripts. */
function Choices({ kind, asked, choices }: Omit<Props, "chosen">) {
  const [typed, setTyped] = useState(asked.query);
  const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
  const found = choices.filter(({ name, program }) =>
    words.every((word) => `${name} ${program}`.toLowerCase().includes(word)),
  );
  return (
    <div className="mt-2 max-w-160">
      <Form method="get" role="search" preventScrollReset replace className="flex items-start gap-3">
        <HiddenAsked asked={asked} without={["q"]} />
        <TextField
          type="search"
          name="q"
          label="Name or program contains"
          className="min-w-0 flex-1"
          defaultValue={asked.query}
          hint={foundWords(kind, found.length, choices.length)}
          onInput={(event) => setTyped(event.currentTarget.value)}
        />
        <button type="submit" className="btn mt-5">
          Find
        </button>
      </Form>
      <ul className="divide-y divide-line">
        {found.slice(0, SHOWN).map(({ id, name, program }) => (
          <li key={id} className="flex items-center justify-between gap-x-4">
            <span className="min-w-0">
              {name} <span className="text-quiet">{program}</span>
            </span>
            <Link
              to={comparisonSearch(asked, { ids: [...asked.ids, id], query: "" })}
              replace
              preventScrollReset
              className="link inline-flex min-h-8 items-center"
            >
              Add<span className="sr-only"> {name}</span>
            </Link>
          </li>
        ))}
      </ul>
    </div>
  );
}

function foundWords(kind: ComparedKind, found: number, all: number): string {
  if (all === 0) return `There is no other ${kind.one}`;
  if (found === 0) return `No ${kind.one} fits: change the search`;
  return found > SHOWN ? `${found} fit, the ${count(SHOWN)} newest are shown` : `${found} of ${all}, newest first`;
}

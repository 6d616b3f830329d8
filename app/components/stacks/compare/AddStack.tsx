import { useState } from "react";
import { Form, Link } from "react-router";
import { comparisonSearch, LEAST_STACKS, MOST_STACKS, type ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import { count } from "#app/lib/count-words.ts";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { StackChoice } from "#app/schemas/stack-comparison.ts";
import { HiddenAsked } from "./HiddenAsked.tsx";

interface Props {
  asked: ComparisonAsked;
  choices: readonly StackChoice[];
  /** how many are chosen already */
  chosen: number;
}

/** As many as are in sight at once. */
const SHOWN = 6;

/** Stacks that may be added, unfolded while there is nothing to compare yet. */
export function AddStack({ asked, choices, chosen }: Props) {
  return (
    <details
      className="screen-only border-t border-line px-4 py-3 tablet:px-6"
      open={chosen < LEAST_STACKS || asked.query !== ""}
    >
      <summary className="w-fit cursor-pointer">
        <h2 className="link inline font-semibold">Add a stack</h2>
      </summary>
      {chosen >= MOST_STACKS ? (
        <p className="mt-1 text-quiet">
          A comparison holds {count(MOST_STACKS)} stacks at most. Remove one to add another.
        </p>
      ) : (
        <Choices asked={asked} choices={choices} />
      )}
    </details>
  );
}

/** Searched while it is typed, by the server where there are no scripts. */
function Choices({ asked, choices }: Omit<Props, "chosen">) {
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
          hint={foundWords(found.length, choices.length)}
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

function foundWords(found: number, all: number): string {
  if (all === 0) return "There is no other stack";
  if (found === 0) return "No stack fits: change the search";
  return found > SHOWN ? `${found} fit, the ${count(SHOWN)} newest are shown` : `${found} of ${all}, newest first`;
}

import { useState } from "react";
import { Form, Link } from "react-router";
import { comparisonSearch, MOST_STACKS, type ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import { count } from "#app/lib/count-words.ts";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { StackChoice } from "#app/schemas/stack-comparison.ts";
import { HiddenAsked } from "./HiddenAsked.tsx";

interface Props {
  asked: ComparisonAsked;
  choices: readonly StackChoice[];
  full: boolean;
}

/** As many as are in sight at once. */
const SHOWN = 6;

/** Stacks that may be added: searched while it is typed, by the server where there are no scripts. */
export function AddStack({ asked, choices, full }: Props) {
  const [typed, setTyped] = useState(asked.query);
  const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
  const found = choices.filter(({ name, program }) =>
    words.every((word) => `${name} ${program}`.toLowerCase().includes(word)),
  );
  return (
    <section
      aria-labelledby="add"
      className="screen-only min-w-0 border-line p-4 max-wide:border-t tablet:px-6 wide:border-l"
    >
      <h2 id="add" className="font-semibold">
        Add a stack
      </h2>
      {full ? (
        <p className="mt-1 text-quiet">
          A comparison holds {count(MOST_STACKS)} stacks at most. Remove one to add another.
        </p>
      ) : (
        <>
          <Form method="get" role="search" preventScrollReset replace className="mt-1 flex items-start gap-3">
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
        </>
      )}
    </section>
  );
}

function foundWords(found: number, all: number): string {
  if (all === 0) return "There is no other stack";
  if (found === 0) return "No stack fits: change the search";
  return found > SHOWN ? `${found} fit, the ${count(SHOWN)} newest are shown` : `${found} of ${all}, newest first`;
}

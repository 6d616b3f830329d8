import type { ReactNode } from "react";
import { Form, Link, useNavigation } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { TickedTable } from "#app/components/ui/ticks/TickedTable.tsx";
import { countOf, some, withLeft, type TickedRows } from "#app/lib/ticked-rows.ts";

interface Props {
  title: string;
  /** what a row is called: one, several */
  what: readonly [string, string];
  /** the list that the rows were ticked in */
  list: { name: string; path: string };
  /** before: what would become of each; after: what did */
  asked: TickedRows;
  done: TickedRows | undefined;
  /** 'Removed' */
  did: string;
  /** what to know before */
  children: ReactNode;
  /** the button, and what it says and the page adds while it is at work; '2 stacks' is handed over */
  button: {
    label: (number: string) => string;
    busy: (number: string) => string;
    meanwhile?: string;
    removes?: boolean;
  };
}

/** Asks once more what is to be done with the rows that are ticked, and says afterwards, row by row, what was. */
export function TickedPage({ title, what, list, asked, done, did, children, button }: Props) {
  const toDo = asked.rows.filter(({ state }) => state === "to do");
  const number = some(toDo.length, what);
  const atWork = useNavigation().state === "submitting";
  const back = (
    <Link to={list.path} className="btn">
      {done ? `To the ${what[1]}` : "Leave them as they are"}
    </Link>
  );
  return (
    <>
      <PageHead title={title} crumbs={[list]} />
      {done ? (
        <>
          <Notice
            kind={countOf(done, "left") + done.hidden > 0 ? "caution" : "done"}
            title={`${did}: ${some(countOf(done, "done"), what)}.`}
          />
          <TickedTable caption="What was done" head="What happened" what={what} {...withLeft(done, asked)} />
          <div className="mt-4">{back}</div>
        </>
      ) : asked.rows.length === 0 ? (
        <EmptyState title={`No ${what[0]} is ticked`} actions={back}>
          Tick {what[1]} in the list, then choose what is to be done with them.
        </EmptyState>
      ) : (
        <>
          <p className="mb-3 max-w-[60em]">{children}</p>
          <div aria-busy={atWork}>
            <TickedTable caption={`What is ticked of the ${what[1]}`} head="What happens" what={what} {...asked} />
          </div>
          <Form
            method="post"
            className="mt-4 flex flex-wrap items-center gap-2"
            // A second press before the button has gone grey would send all of it again.
            onSubmit={(event) => atWork && event.preventDefault()}
          >
            {toDo.map(({ id, version }) => (
              <input key={id} type="hidden" name="of" value={`${id} ${version}`} />
            ))}
            {toDo.length > 0 && (
              <SubmitButton busy={button.busy(number)} removes={button.removes ?? false}>
                {button.label(number)}
              </SubmitButton>
            )}
            {!atWork && back}
          </Form>
          <p role="status" className="mt-2 max-w-[60em] text-quiet empty:hidden">
            {atWork && button.meanwhile !== undefined && `${button.busy(number)}. ${button.meanwhile}`}
          </p>
        </>
      )}
    </>
  );
}

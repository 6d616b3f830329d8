import type { ReactNode } from "react";
import { Form, Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { TickedTable } from "#app/components/ui/ticks/TickedTable.tsx";
import { countOf, some, type TickedRows } from "#app/lib/ticked-rows.ts";

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
  /** the button, by the number that it does something with */
  button: (number: string) => ReactNode;
}

/** Asks once more what is to be done with the rows that are ticked, and says afterwards, row by row, what was. */
export function TickedPage({ title, what, list, asked, done, did, children, button }: Props) {
  const toDo = asked.rows.filter(({ state }) => state === "to do");
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
          <TickedTable caption="What was done" head="What happened" what={what} {...done} />
          <div className="mt-4">{back}</div>
        </>
      ) : asked.rows.length === 0 ? (
        <EmptyState title={`No ${what[0]} is ticked`} actions={back}>
          Tick {what[1]} in the list, then choose what is to be done with them.
        </EmptyState>
      ) : (
        <>
          <p className="mb-3 max-w-[60em]">{children}</p>
          <TickedTable caption={`What is ticked of the ${what[1]}`} head="What happens" what={what} {...asked} />
          <Form method="post" className="mt-4 flex flex-wrap gap-2">
            {toDo.map(({ id, version }) => (
              <input key={id} type="hidden" name="of" value={`${id} ${version}`} />
            ))}
            {toDo.length > 0 && button(some(toDo.length, what))}
            {back}
          </Form>
        </>
      )}
    </>
  );
}

import type { ReactNode } from "react";
import { Form, Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { TickedTable } from "#app/components/ui/ticks/TickedTable.tsx";
import { countOf, some, type TickedRows } from "#app/lib/ticked-rows.ts";

const STACKS = ["stack", "stacks"] as const;

interface Props {
  title: string;
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

/** Asks once more what is to be done with the stacks that are ticked, and says afterwards, row by row, what was. */
export function TickedStacks({ title, asked, done, did, children, button }: Props) {
  const toDo = asked.rows.filter(({ state }) => state === "to do");
  const back = (
    <Link to="/stacks" className="btn">
      {done ? "To the stacks" : "Leave them as they are"}
    </Link>
  );
  return (
    <>
      <PageHead title={title} crumbs={[{ name: "Stacks", path: "/stacks" }]} />
      {done ? (
        <>
          <Notice
            kind={countOf(done, "left") + done.hidden > 0 ? "caution" : "done"}
            title={`${did}: ${some(countOf(done, "done"), STACKS)}.`}
          />
          <TickedTable caption="What was done" head="What happened" what={STACKS} {...done} />
          <div className="mt-4">{back}</div>
        </>
      ) : asked.rows.length === 0 ? (
        <EmptyState title="No stack is ticked" actions={back}>
          Tick stacks in the list, then choose what is to be done with them.
        </EmptyState>
      ) : (
        <>
          <p className="mb-3 max-w-[60em]">{children}</p>
          <TickedTable caption="Stacks that are ticked" head="What happens" what={STACKS} {...asked} />
          <Form method="post" className="mt-4 flex flex-wrap gap-2">
            {toDo.map(({ id, version }) => (
              <input key={id} type="hidden" name="of" value={`${id} ${version}`} />
            ))}
            {toDo.length > 0 && button(some(toDo.length, STACKS))}
            {back}
          </Form>
        </>
      )}
    </>
  );
}

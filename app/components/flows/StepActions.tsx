import { Link, useSearchParams } from "react-router";
import type { StepRow } from "#app/lib/flow-rows.ts";
import { StepIcon } from "./StepIcon.tsx";

interface Props {
  row: StepRow;
  /** number of steps in the flow */
  of: number;
  /** id of the form that changes steps */
  form: string;
}

const BUTTON =
  "inline-flex size-8 cursor-pointer items-center justify-center rounded text-ink no-underline hover:bg-wash max-tablet:size-11 aria-disabled:cursor-default aria-disabled:text-edge aria-disabled:hover:bg-transparent";

/** What can be done to one row: moved, copied, removed, or a step put in before it. All of it works without scripts. */
export function StepActions({ row, of, form }: Props) {
  const [search] = useSearchParams();
  const name = `step ${row.number}, ${row.title}`;
  const moved = search.get("step") === row.id ? search.get("done") : null;
  const move = (kind: "up" | "down", possible: boolean) => (
    <button
      type="submit"
      form={form}
      name="change"
      value={`${kind} ${row.id}`}
      className={BUTTON}
      aria-label={`Move ${kind} ${name}`}
      title={`Move ${kind} (Alt and arrow key)`}
      aria-disabled={possible ? undefined : true}
      // A row that has been moved keeps the focus on the button that moved it.
      autoFocus={moved === kind}
      onClick={possible ? undefined : (event) => event.preventDefault()}
    >
      <StepIcon kind={kind} />
    </button>
  );
  return (
    <div className="-mt-1.5 flex justify-end max-tablet:mt-0 max-tablet:-ml-3 max-tablet:justify-start">
      {move("up", row.number > 1)}
      {move("down", row.number < of)}
      <button
        type="submit"
        form={form}
        name="change"
        value={`copy ${row.id}`}
        className={BUTTON}
        aria-label={`Copy ${name}`}
        title="Copy"
      >
        <StepIcon kind="copy" />
      </button>
      <Link
        to={`steps/new?at=${row.number}`}
        className={BUTTON}
        aria-label={`Insert a step before ${name}`}
        title="Insert a step before this one"
      >
        <StepIcon kind="insert" />
      </Link>
      <button
        type="submit"
        form={form}
        name="change"
        value={`remove ${row.id}`}
        className={`${BUTTON} hover:text-stop`}
        aria-label={`Remove ${name}`}
        title="Remove"
      >
        <StepIcon kind="remove" />
      </button>
    </div>
  );
}

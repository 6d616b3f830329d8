import { useId } from "react";
import { Form, useNavigation } from "react-router";
import type { StressValueRow } from "#app/schemas/film-stress.ts";

/** Sets a value aside with a reason, or puts it back. */
export function ValueActions({ row, version }: { row: StressValueRow; version: number }) {
  const { state, formData } = useNavigation();
  const waiting = state !== "idle" && formData?.get("row") === row.id;
  const name = `value of ${row.measuredAt.slice(0, 10)}`;
  if (row.state === "set aside")
    return (
      <Form method="post" preventScrollReset>
        <Hidden row={row} version={version} />
        <button
          type="submit"
          name="intent"
          value="put back"
          className="btn"
          disabled={waiting}
          aria-label={`Put back: ${name}`}
        >
          {waiting ? "Saving" : "Put back"}
        </button>
      </Form>
    );
  return (
    <details>
      <summary className="link w-fit cursor-pointer whitespace-nowrap">Set aside</summary>
      <SetAside row={row} version={version} waiting={waiting} name={name} />
    </details>
  );
}

function SetAside({
  row,
  version,
  waiting,
  name,
}: {
  row: StressValueRow;
  version: number;
  waiting: boolean;
  name: string;
}) {
  const field = useId();
  return (
    <Form method="post" preventScrollReset className="mt-2 w-60 max-w-full" key={version}>
      <Hidden row={row} version={version} />
      <div className="field">
        <label htmlFor={field}>Why it does not count</label>
        <input
          id={field}
          name="reason"
          required
          maxLength={300}
          autoComplete="off"
          aria-describedby={`${field}-note`}
        />
        <small id={`${field}-note`}>All who see the library read it: name no wafer</small>
      </div>
      <button
        type="submit"
        name="intent"
        value="set aside"
        className="btn btn-remove mt-2"
        disabled={waiting}
        aria-label={`Set aside: ${name}`}
      >
        {waiting ? "Saving" : "Set aside"}
      </button>
    </Form>
  );
}

function Hidden({ row, version }: { row: StressValueRow; version: number }) {
  return (
    <>
      <input type="hidden" name="row" value={row.id} />
      <input type="hidden" name="version" value={version} />
    </>
  );
}

import { useId } from "react";
import { Form } from "react-router";

interface Props {
  what: "study" | "reading";
  id: string;
  /** what it is, for who hears the page: 'study of 2026-12-01' */
  name: string;
}

/** Takes a study or a reading out of the figures, with the reason; it stays to be seen. */
export function SetAside({ what, id, name }: Props) {
  const field = useId();
  return (
    <details className="screen-only">
      <summary className="link w-fit cursor-pointer text-label" aria-label={`Set aside the ${name}`}>
        Set aside
      </summary>
      <Form method="post" preventScrollReset className="mt-2 flex flex-wrap items-end gap-2">
        <input type="hidden" name="what" value={what} />
        <input type="hidden" name="id" value={id} />
        <div className="field w-72 max-w-full">
          <label htmlFor={field}>Why it does not count</label>
          <input id={field} name="reason" required maxLength={200} />
        </div>
        <button type="submit" className="btn">
          Set aside
        </button>
      </Form>
    </details>
  );
}

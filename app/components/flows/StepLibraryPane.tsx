import { Form, Link, useSearchParams } from "react-router";
import { TextField } from "#app/components/ui/TextField.tsx";
import { withParams } from "#app/lib/list-params.ts";

interface Props {
  library: {
    query: string;
    total: number;
    offered: { id: string; name: string; kind: string }[];
    chosen: { id: string; step: { title: string } } | null;
  };
  /** of the new step, from 1 */
  number: number;
}

/** The step library beside the form of a new step: one press fills the form, nothing is saved by it. */
export function StepLibraryPane({ library, number }: Props) {
  const [search] = useSearchParams();
  const { query, total, offered, chosen } = library;
  return (
    <aside className="frame p-4 tablet:p-6" aria-labelledby="library-head">
      <h2 id="library-head" className="font-semibold">
        From the step library
      </h2>
      {chosen && (
        <p className="mt-1" role="status">
          The form holds “{chosen.step.title}”. Change what differs here.
        </p>
      )}
      <Form method="get" className="mt-2 flex items-end gap-2" role="search" preventScrollReset>
        <input type="hidden" name="at" value={number} />
        <TextField
          key={query}
          name="q"
          type="search"
          label="Search by name or kind"
          defaultValue={query}
          className="min-w-0 flex-1"
        />
        <button type="submit" className="btn mb-5">
          Show
        </button>
      </Form>
      {offered.length === 0 && <p className="text-quiet">No step of the library fits.</p>}
      <ul>
        {offered.map(({ id, name, kind }) => (
          <li key={id} className="border-t border-line py-1.5">
            <Link to={withParams(search, { from: id, at: String(number) })} className="link">
              {name}
            </Link>
            <span className="block text-label text-quiet">{kind}</span>
          </li>
        ))}
      </ul>
      {total > offered.length && (
        <p className="border-t border-line pt-1.5 text-label text-quiet">
          {total - offered.length} more: search, or{" "}
          <Link to="/flows/library/steps" className="link">
            open the library
          </Link>
        </p>
      )}
    </aside>
  );
}

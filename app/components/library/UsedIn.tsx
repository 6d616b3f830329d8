import { Link } from "react-router";
import type { LibraryUse } from "#app/schemas/library-records.ts";

/** Stacks and flows of the reader's own programs that use a record. */
export function UsedIn({ uses }: { uses: LibraryUse[] }) {
  return (
    <section aria-labelledby="used-in">
      <h2 id="used-in" className="font-semibold">
        Used in
      </h2>
      {uses.length === 0 ? (
        <p className="mt-1 text-quiet">No stack or flow of your programs uses it.</p>
      ) : (
        <ul className="mt-1">
          {uses.map(({ kind, id, name }) => (
            <li key={id} className="border-t border-line py-2 first:border-0">
              <Link to={`/${kind}s/${id}`} className="link">
                {name}
              </Link>{" "}
              <span className="text-quiet">{kind}</span>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

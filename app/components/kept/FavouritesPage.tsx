import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import type { KeptKind } from "#app/lib/kept-kinds.ts";
import type { FoundRow } from "#app/schemas/search.ts";
import { StarButton } from "./StarButton.tsx";

interface Props {
  favourites: (FoundRow & { kind: KeptKind; id: string })[];
}

/** Everything that the person has marked, the newest first; each mark can be taken away. */
export function FavouritesPage({ favourites }: Props) {
  return (
    <>
      <PageHead title="Favourites" remark={favourites.length > 0 ? `${favourites.length} marked` : undefined} />
      {favourites.length > 0 ? (
        <ul className="max-w-240 border-t border-ink">
          {favourites.map(({ key, kind, id, name, about, path }) => (
            <li key={key} className="flex items-center gap-2 border-b border-line py-(--list-padding)">
              <StarButton kind={kind} id={id} name={name} />
              <p className="min-w-0 wrap-anywhere">
                <Link to={path} className="link">
                  {name}
                </Link>{" "}
                <span className="text-quiet">{about}</span>
              </p>
            </li>
          ))}
        </ul>
      ) : (
        <EmptyState title="Nothing is marked yet">
          Press the star beside the name of a stack, flow, assessment, film, scan, wafer or lot. It then stands here, on
          Today and in the search, before anything is typed.
        </EmptyState>
      )}
    </>
  );
}

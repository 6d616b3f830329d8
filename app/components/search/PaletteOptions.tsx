import { Link } from "react-router";
import type { PaletteOption } from "./palette-option.ts";

interface Props {
  id: string;
  options: PaletteOption[];
  /** the chosen one */
  at: number;
  onOpen: () => void;
}

/** The lines of the palette under the names of their groups. The focus stays in the field, which names the chosen one. */
export function PaletteOptions({ id, options, at, onOpen }: Props) {
  const groups = [...new Set(options.map(({ group }) => group))];
  return (
    <div id={`${id}-options`} role="listbox" aria-label="Found" className="max-h-[60vh] overflow-y-auto py-1">
      {groups.map((group) => (
        <div key={group} role="group" aria-label={group} className="px-2 pb-1">
          <div aria-hidden className="px-2 pt-2 pb-1 text-label font-semibold text-quiet">
            {group}
          </div>
          {options.map(({ key, name, about, path, group: own }, index) =>
            own === group ? (
              <Link
                key={key}
                id={`${id}-${index}`}
                role="option"
                aria-selected={index === at}
                tabIndex={-1}
                to={path}
                onClick={onOpen}
                className="flex min-h-9 flex-wrap content-center items-baseline gap-x-2 rounded px-2 py-1 max-tablet:min-h-11 text-inherit no-underline hover:bg-wash aria-selected:bg-wash aria-selected:outline aria-selected:outline-edge"
              >
                <span className="wrap-anywhere">{name}</span>
                {about && <span className="text-label text-quiet">{about}</span>}
              </Link>
            ) : null,
          )}
        </div>
      ))}
    </div>
  );
}

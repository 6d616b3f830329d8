import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { FloorBlock } from "#app/schemas/floor-view.ts";

/** What must not go on, each with its words and whom to call. Who may clear it is led to where that is done. */
export function FloorBlocks({ blocks, lot }: { blocks: readonly FloorBlock[]; lot: string }) {
  if (blocks.length === 0) return null;
  return (
    <ul className="mb-4" aria-label="What blocks">
      {blocks.map(({ kind, id, step, what, remedy, opened, mayClear }) => (
        <li key={`${kind} ${id} ${step}`} className="mb-2 flex gap-4 border-2 border-stop bg-raised p-4">
          <Swatch level="stop" width={40} height={40} scale={1.04} />
          <div role="alert" className="min-w-0">
            <p className="text-figure font-semibold text-stop">{what}</p>
            {opened && (
              <p className="text-lead">
                “{opened.reason}”{" "}
                <span className="text-quiet">
                  {opened.by}, {minuteOf(opened.at)}
                </span>
              </p>
            )}
            <p className="text-lead">{remedy}</p>
            {mayClear && (
              <a href={`/lots/${lot}`} className="link inline-flex min-h-11 items-center text-lead">
                Clear it on the lot’s page
              </a>
            )}
          </div>
        </li>
      ))}
    </ul>
  );
}

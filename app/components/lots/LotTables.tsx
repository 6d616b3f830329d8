import { Form } from "react-router";
import type { LotTable } from "#app/schemas/lot-view.ts";

/** The tables that figures of the lot came from, each with the way back. */
export function LotTables({ tables, mayUndo }: { tables: readonly LotTable[]; mayUndo: boolean }) {
  return (
    <section className="mt-8" aria-labelledby="tables">
      <h2 id="tables" className="font-semibold">
        Imported tables
      </h2>
      <ul className="mt-2 border-t border-ink">
        {tables.map(({ reading, file, kind, wafers, createdAt, createdBy }) => {
          const of = wafers === 1 ? "1 wafer of this lot" : `${wafers} wafers of this lot`;
          return (
            <li key={reading} className="border-b border-line py-2">
              <p className="wrap-anywhere">
                <a href={`/scans/files/${file.id}`} className="link" download>
                  {file.name}
                </a>
                : <span className="text-quiet">{`${kind}, ${of}, ${createdAt.slice(0, 10)}, ${createdBy}`}</span>
              </p>
              {mayUndo && (
                <details>
                  <summary className="link w-fit cursor-pointer">Undo this import</summary>
                  <Form method="post" preventScrollReset className="mt-2 flex flex-wrap items-center gap-4">
                    <p>What the table says of its wafers goes. The file itself is kept and can be imported again.</p>
                    <input type="hidden" name="table" value={reading} />
                    <button type="submit" name="intent" value="undo" className="btn btn-remove">
                      Undo the import
                    </button>
                  </Form>
                </details>
              )}
            </li>
          );
        })}
      </ul>
    </section>
  );
}

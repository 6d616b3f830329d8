import { attachment } from "#app/lib/content-disposition.ts";

/** A table as a file to be saved under a name, without its ending. */
export function csvFile(name: string, csv: string): Response {
  return new Response(csv, {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${name}.csv`),
      "Cache-Control": "no-store",
    },
  });
}

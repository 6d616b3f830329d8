import { profilesCsv } from "#app/lib/reading-csv.ts";
import { readingJson } from "#app/lib/reading-json.ts";
import { attachment } from "#app/lib/content-disposition.ts";
import type { ScanReadingDetail } from "#app/schemas/scan-reading.ts";
import { problemJson } from "#app/server/problem-json.server.ts";

/** Whether a request would rather have CSV. Who names neither gets JSON. */
export function wantsCsv(request: Request): boolean {
  const accept = (request.headers.get("Accept") ?? "").toLowerCase();
  return accept.includes("text/csv") && !accept.includes("application/json");
}

/** A reading in the form that the request asks for: JSON, or CSV for profiles. */
export function scanAnswer(request: Request, reading: ScanReadingDetail, status: 200 | 201): Response {
  const headers = { Location: `/api/v1/scans/${reading.id}`, "Cache-Control": "no-store", Vary: "Accept" };
  if (!wantsCsv(request)) return Response.json(readingJson(reading), { status, headers });
  if (reading.content.kind !== "profiles")
    return problemJson(406, `A ${reading.content.kind} comes as JSON; its file is kept as it came.`, { headers });
  return new Response(profilesCsv(reading.content.profiles), {
    status,
    headers: {
      ...headers,
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${reading.file.name.replace(/\.\w+$/, "")}, as read.csv`),
    },
  });
}

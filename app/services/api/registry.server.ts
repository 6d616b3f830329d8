import type { Operation } from "./operation.server.ts";
import { estimateOperations } from "./operations/estimates.server.ts";
import { flowOperations } from "./operations/flows.server.ts";
import { incidentOperations } from "./operations/incidents.server.ts";
import { libraryOperations } from "./operations/library.server.ts";
import { lotOperations } from "./operations/lots.server.ts";
import { scanOperations } from "./operations/scans.server.ts";
import { sheetOperations } from "./operations/sheets.server.ts";
import { stackOperations } from "./operations/stacks.server.ts";

/** Every operation of the API, in the order of its document. */
export const OPERATIONS: readonly Operation[] = [
  ...estimateOperations,
  ...libraryOperations,
  ...stackOperations,
  ...flowOperations,
  ...sheetOperations,
  ...scanOperations,
  ...lotOperations,
  ...incidentOperations,
];

/** What an address below /api/v1 leads to: its operations by method, and its parameters. Null where nothing is. */
export function operationsAt(path: string): { operations: Operation[]; params: Record<string, string> } | null {
  for (const { path: template } of OPERATIONS) {
    const params = matched(template, path);
    if (params) return { operations: OPERATIONS.filter((each) => each.path === template), params };
  }
  return null;
}

function matched(template: string, path: string): Record<string, string> | null {
  const parts = path.split("/");
  const asked = template.split("/");
  if (parts.length !== asked.length) return null;
  const params: Record<string, string> = {};
  for (const [index, part] of asked.entries()) {
    const given = parts[index] ?? "";
    const [, name] = /^\{(\w+)\}$/.exec(part) ?? [];
    if (name !== undefined) params[name] = given;
    else if (part !== given) return null;
  }
  return params;
}

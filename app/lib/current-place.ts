/** Addresses that lie in a place without its path before them. */
const ALSO: Record<string, readonly string[]> = {
  "/flows": ["/assessments"],
  "/scans": ["/lots", "/predictions", "/wafers", "/instruments", "/import-profiles", "/jobs"],
};

/** Whether an address lies in the place that has the path; the assessment of a flow lies in the flows. */
export function liesIn(path: string, address: string): boolean {
  const below = (top: string) => address === top || address.startsWith(`${top}/`);
  if (path === "/") return address === "/";
  return below(path) || (ALSO[path] ?? []).some(below);
}

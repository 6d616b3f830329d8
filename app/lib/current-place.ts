/** Whether an address lies in the place that has the path; the assessment of a flow lies in the flows, wafers and instruments in the scans. */
export function liesIn(path: string, address: string): boolean {
  const below = (top: string) => address === top || address.startsWith(`${top}/`);
  if (path === "/") return address === "/";
  if (path === "/scans" && (below("/wafers") || below("/instruments"))) return true;
  return below(path) || (path === "/flows" && below("/assessments"));
}

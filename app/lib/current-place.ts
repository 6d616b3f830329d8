/** Whether an address lies in the place that has the path; the assessment of a flow lies in the flows, what scans are held against in the scans. */
export function liesIn(path: string, address: string): boolean {
  const below = (top: string) => address === top || address.startsWith(`${top}/`);
  if (path === "/") return address === "/";
  return below(path) || (path === "/flows" && below("/assessments")) || (path === "/scans" && below("/predictions"));
}

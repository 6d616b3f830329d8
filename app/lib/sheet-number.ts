/** Number of a handling-risk sheet: 'TERN-H003', the third of program Tern. Its revisions share it. */
export function sheetNumber(programSlug: string, number: number): string {
  return `${programSlug.toUpperCase()}-H${String(number).padStart(3, "0")}`;
}

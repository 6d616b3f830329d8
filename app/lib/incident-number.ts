/** Number of an incident: 'TERN-I003', the third of program Tern. */
export function incidentNumber(programSlug: string, number: number): string {
  return `${programSlug.toUpperCase()}-I${String(number).padStart(3, "0")}`;
}

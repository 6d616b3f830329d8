/** Number of the document that an assessment is: 'TERN-A003', the third of program Tern. */
export function assessmentNumber(programSlug: string, documentNumber: number): string {
  return `${programSlug.toUpperCase()}-A${String(documentNumber).padStart(3, "0")}`;
}

/** The name of an input within a sentence: of the wafer's only the first letter is small, a film keeps its name. */
export function inSentence(label: string): string {
  return label.includes(": ") ? label.replace(": ", ", ") : label.charAt(0).toLowerCase() + label.slice(1);
}

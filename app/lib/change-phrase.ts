/** A change in words: what of which step, what it is planned to be, and what it is to be instead. */
export interface ChangeWords {
  what: string;
  step: number;
  /** null where there is nothing yet */
  from: string | null;
  to: string;
}

/** A change as one phrase: 'step 12, silicon left: 54 µm instead of 50 µm'. */
export function changePhrase({ what, step, from, to }: ChangeWords): string {
  const instead = from === null ? "" : ` instead of ${from}`;
  return `step ${step}, ${lowerFirst(what)}: ${to}${instead}`;
}

/** Words as they stand after a comma. */
export const lowerFirst = (words: string) => words.charAt(0).toLowerCase() + words.slice(1);

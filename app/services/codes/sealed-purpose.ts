/** What the secret of a person's one-time codes is sealed for: in another person's row it does not open. */
export const purposeOf = (person: string): string => `one-time codes of ${person}`;

/** Path of the public page that tells whether a paper is still current; the code on it leads there. */
export const statusPath = (token: string): string => `/s/${token}`;

const ADDRESS = /^https?:\/\/[^/\s]+(\/s\/[\w-]{22})$/;

/** That path, in the address that the code on a paper holds; null for any other text. Where it was printed for does not matter. */
export const statusPathIn = (text: string): string | null => ADDRESS.exec(text.trim())?.[1] ?? null;

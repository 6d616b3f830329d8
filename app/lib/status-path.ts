/** Path of the public page that tells whether a paper is still current; the code on it leads there. */
export const statusPath = (token: string): string => `/s/${token}`;

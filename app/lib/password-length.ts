/** Fewest and most characters of a password. */
export const SHORTEST_PASSWORD = 12;
export const MOST_PASSWORD = 200;

/** Gives what was made under a name before, or makes it and keeps it: a run that was cut short goes on where it stopped. */
export type Keep = <T>(name: string, make: () => T) => T;

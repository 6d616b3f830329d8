import { UniqueConstraintViolationException } from "@mikro-orm/core";
import { problem } from "#app/server/problem.server.ts";

const LONGEST_NAME = 120;
const ATTEMPTS = 5;

/** The name, or 'Name, 2', 'Name, 3', … : the first that is free. */
export function freeName(name: string, taken: ReadonlySet<string>): string {
  if (!taken.has(name)) return name;
  for (let count = 2; ; count++) {
    const suffix = `, ${count}`;
    const candidate = name.slice(0, LONGEST_NAME - suffix.length) + suffix;
    if (!taken.has(candidate)) return candidate;
  }
}

/** Runs work that takes a free name, once more when somebody else took that name in the same moment. */
export async function takingName<Result>(work: () => Promise<Result>): Promise<Result> {
  for (let attempt = 1; attempt <= ATTEMPTS; attempt++)
    try {
      return await work();
    } catch (error) {
      if (!(error instanceof UniqueConstraintViolationException)) throw error;
    }
  throw problem(409, "Several people are giving this name at the same moment. Please try again.");
}

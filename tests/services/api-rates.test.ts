import { expect, test } from "vitest";
import { useDatabase } from "#tests/db/test-database.ts";
import { ask, tokenOf } from "./api-client.ts";

process.env["API_REQUESTS_PER_MINUTE"] = "5";
const database = useDatabase({ demo: true });

test(
  "requests are counted by token in the database, and say when they may come again",
  { timeout: 60_000 },
  async () => {
    const token = await tokenOf(database, "engineer", "tern");
    const other = await tokenOf(database, "engineer", "tern");
    const answers = [];
    for (let index = 0; index < 6; index++) answers.push(await ask("GET", "/silicon", { token }));
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200, 200, 429]);
    expect(answers.map(({ headers }) => headers.get("RateLimit-Remaining"))).toEqual(["4", "3", "2", "1", "0", "0"]);
    expect(Number(answers.at(-1)?.headers.get("Retry-After"))).toBeGreaterThan(0);
    expect(answers.at(-1)?.headers.get("Content-Type")).toBe("application/problem+json");
    expect((await ask("GET", "/silicon", { token: other })).status).toBe(200);
  },
);

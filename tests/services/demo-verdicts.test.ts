import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

/** The verdict of each demo flow, the steps that must not run and, where no step is barred, those to be signed at least. */
const EXPECTED: [name: string, outcome: string, barred: number[], signed: number[]][] = [
  ["Tern T-2, to 100 µm on tape", "clear", [], []],
  ["Petrel P-3, to 50 µm on glass 3.0 ppm", "caution", [], [14, 15]],
  ["Petrel P-3, on glass 3.3 ppm", "do not run", [10], []],
  ["Petrel P-3, on glass 7.2 ppm", "do not run", [10], []],
  ["Fulmar F-1 A, to 20 µm, slide adhesive", "do not run", [12, 13, 18, 21], []],
  ["Fulmar F-1 B, to 20 µm, peel adhesive", "caution", [], [11, 12, 18, 21]],
];

interface Result {
  verdict: { outcome: string };
  findings: { step: number; outcome: string }[];
}

test.each(EXPECTED)("%s: %s", { timeout: 60_000 }, async (name, outcome, barred, signed) => {
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  const engineer = await scopeOfPerson(database, "engineer");
  const [flow] = await asOwner<{ id: string }>(database, "select id from flow where name = ?", [name]);
  const ran = await runAssessment(engineer, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.reason);
  const [stored] = await asOwner<{ result: Result }>(database, "select result from assessment where id = ?", [ran.id]);
  const { verdict, findings } = stored?.result ?? { verdict: null, findings: [] };
  const steps = (word: string) => [
    ...new Set(findings.filter((each) => each.outcome === word).map(({ step }) => step)),
  ];
  expect(verdict?.outcome).toBe(outcome);
  expect(steps("do not run")).toEqual(expect.arrayContaining(barred));
  if (barred.length === 0) expect(steps("do not run")).toEqual([]);
  expect(steps("caution")).toEqual(expect.arrayContaining(signed));
  if (outcome === "clear") expect(findings.filter((each) => each.outcome !== "clear")).toEqual([]);
});

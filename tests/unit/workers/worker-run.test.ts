import { expect, test } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { latestWins } from "#app/lib/latest-wins.ts";
import { tellRun, type Run, type RunMessage } from "#app/lib/worker-run.ts";

function told(run: Run<string>): RunMessage<string>[] {
  const messages: RunMessage<string>[] = [];
  tellRun(run, (message) => messages.push(message));
  return messages;
}

test("a run tells how far it is with what it has found, and at the end what came out", () => {
  function* run(): Run<string> {
    yield { done: 1, of: 2, found: () => "half" };
    return "all";
  }
  expect(told(run())).toEqual([
    { kind: "progress", done: 1, of: 2, found: "half" },
    { kind: "done", found: "all" },
  ]);
});

test("progress that comes faster than anybody reads is passed over, and nothing is made for it", () => {
  let made = 0;
  function* run(): Run<string> {
    for (let done = 1; done <= 1000; done += 1)
      yield {
        done,
        of: 1000,
        found: () => {
          made += 1;
          return String(done);
        },
      };
    return "all";
  }
  const messages = told(run());
  expect(messages.length).toBeLessThan(20);
  expect(made).toBe(messages.length - 1);
  expect(messages.at(-1)).toEqual({ kind: "done", found: "all" });
});

test("a refusal of the engine is said as a sentence with its step; anything else is an error", () => {
  function* refused(): Run<string> {
    yield { done: 0, of: 1 };
    throw new EngineInputError("steps[2].siliconAfter", "no silicon would be left after this step", "> 0 m");
  }
  expect(told(refused()).at(-1)).toEqual({
    kind: "refused",
    why: "This cannot be computed. Step 3: no silicon would be left after this step.",
  });
  function* broken(): Run<string> {
    yield { done: 0, of: 1 };
    throw new TypeError("of our own making");
  }
  expect(() => told(broken())).toThrow("of our own making");
});

test("of questions that come while one is on its way only the latest is sent, and only its answer counts", () => {
  const sent: string[] = [];
  const queue = latestWins<{ key: string }>(({ key }) => sent.push(key));
  queue.ask({ key: "a" });
  queue.ask({ key: "b" });
  queue.ask({ key: "c" });
  expect(sent).toEqual(["a"]);
  expect(queue.answered("a")).toBe(false);
  expect(sent).toEqual(["a", "c"]);
  expect(queue.answered("c")).toBe(true);
  queue.ask({ key: "d" });
  expect(sent).toEqual(["a", "c", "d"]);
});

test("an answer that nobody wants any more is dropped", () => {
  const sent: string[] = [];
  const queue = latestWins<{ key: string }>(({ key }) => sent.push(key));
  queue.ask({ key: "a" });
  queue.ask({ key: "b" });
  queue.forget();
  expect(queue.answered("a")).toBe(false);
  expect(sent).toEqual(["a"]);
});

import { afterAll, beforeAll, expect, test } from "vitest";
import type { StandNow } from "#app/schemas/changes.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const streams = () => import("#app/services/changes/changes-stream.server.ts");
const hearing = () => import("#app/server/changes.server.ts");

const status = (code: number) => ({ init: { status: code } });

let engineer: ActorScope;
let owner: ActorScope;
let stack = "";

beforeAll(async () => {
  await streams();
  engineer = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
  stack = (await asOwner<{ id: string }>(database, "select id from stack order by name limit 1"))[0]?.id ?? "";
}, 60_000);

afterAll(async () => (await hearing()).stopHearing());

/** What a stream says, one event after the other; null once it has ended. */
async function listen(scope: ActorScope, of: string[]) {
  const leaving = new AbortController();
  const { changesStream } = await streams();
  const answer = await changesStream(scope, of, leaving.signal);
  const reader = answer.body?.getReader();
  let text = "";
  return {
    answer,
    leave: () => leaving.abort(),
    next: async (): Promise<StandNow | null> => {
      for (;;) {
        const found = /data: (.*)\n\n/.exec(text);
        if (found?.[1]) {
          text = text.slice(found.index + found[0].length);
          return JSON.parse(found[1]) as StandNow;
        }
        const part = await reader?.read();
        if (!part || part.done) return null;
        text += new TextDecoder().decode(part.value);
      }
    },
  };
}

/** Touches a stack as a person, as a save does. */
async function touch(scope: ActorScope) {
  const { inScope } = await import("#app/server/scope.server.ts");
  await inScope(scope, (em) => em.execute("update stack set note = note where id = ?", [stack]));
}

test("tells how a record stands, and again when somebody changes it, their own changes as such", async () => {
  const listener = await listen(engineer, [`stack:${stack}`]);
  expect(listener.answer.headers.get("Content-Type")).toBe("text/event-stream");
  const first = await listener.next();
  expect(first).toMatchObject({ own: false });
  await touch(owner);
  const second = await listener.next();
  expect(second).toMatchObject({ own: false });
  expect(second?.stand).not.toBe(first?.stand);
  await touch(engineer);
  expect(await listener.next()).toMatchObject({ own: true });
  // Of several at once that of somebody else counts.
  await Promise.all([touch(engineer), touch(owner)]);
  expect(await listener.next()).toMatchObject({ own: false });
  listener.leave();
  expect(await listener.next()).toBeNull();
});

test("a flow changes with its assessments, a sheet with its revisions", async () => {
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f join program p on p.id = f.program_id where p.slug = 'tern' order by f.name limit 1",
  );
  const listener = await listen(owner, [`flow:${flow?.id}`]);
  const first = await listener.next();
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  await runAssessment(engineer, flow?.id ?? "");
  expect((await listener.next())?.stand).not.toBe(first?.stand);
  listener.leave();
});

test("tells nobody of what is not theirs, and nothing that is not watched", async () => {
  const guest = await scopeOfPerson(database, "guest");
  const { changesStream } = await streams();
  const ask = (scope: ActorScope, ...of: string[]) => changesStream(scope, of, new AbortController().signal);
  await expect(ask(guest, `stack:${stack}`)).rejects.toMatchObject(status(403));
  await expect(ask(engineer, "stack:5f0c2f6e-7f0a-4c58-9a47-51d0a3f5b001")).rejects.toMatchObject(status(404));
  await expect(ask(engineer, "stack:x")).rejects.toMatchObject(status(404));
  for (const of of [[], ["person:5f0c2f6e-7f0a-4c58-9a47-51d0a3f5b001"], Array<string>(51).fill(`stack:${stack}`)])
    await expect(ask(engineer, ...of)).rejects.toMatchObject(status(400));
  const outsider = await scopeOfPerson(database, "technician");
  await asOwner(
    database,
    "delete from membership where person_id = ? and program_id = (select program_id from stack where id = ?)",
    [outsider.actor.id, stack],
  );
  await expect(ask(outsider, `stack:${stack}`)).rejects.toMatchObject(status(404));
});

test("ends for who may not see it any more, for all when the process ends, and is not given to one without end", async () => {
  const listener = await listen(engineer, [`stack:${stack}`]);
  await listener.next();
  const many = [];
  for (let one = 1; one < 20; one += 1) many.push(await listen(engineer, [`stack:${stack}`]));
  expect((await listen(engineer, [`stack:${stack}`])).answer.status).toBe(204);
  for (const each of many) each.leave();
  const again = await listen(engineer, [`stack:${stack}`]);
  expect(again.answer.status).toBe(200);
  await again.next();
  await asOwner(database, "delete from membership where person_id = ?", [engineer.actor.id]);
  await touch(owner);
  expect(await listener.next()).toBeNull();
  const last = await listen(owner, [`stack:${stack}`]);
  await last.next();
  await (await hearing()).stopHearing();
  expect(await last.next()).toBeNull();
});

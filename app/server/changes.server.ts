import { EventEmitter } from "node:events";
import { orm } from "#app/db/orm.server.ts";
import { log } from "./log.server.ts";

/** The channel of the database's triggers. */
const CHANNEL = "planeward_changes";
/** Told to whoever waits when nothing will be heard any more over this connection. */
const LOST = "lost";

/** A connection of the database's own driver, outside the pool. */
interface Listening {
  on: ((event: "notification", heard: (message: { payload?: string }) => void) => void) &
    ((event: "error" | "end", ended: (error?: Error) => void) => void);
  query: (text: string) => Promise<unknown>;
  end: () => Promise<void>;
}

interface Heard {
  events: EventEmitter;
  connection: Listening;
}

/** One for each process: the database tells each of them once, and they tell everybody who looks at the record. */
const kept = globalThis as { planewardHears?: Promise<Heard> | undefined };

async function listen(): Promise<Heard> {
  const { em } = await orm();
  const { client } = em.getConnection().getKnex() as { client: { acquireRawConnection: () => Promise<Listening> } };
  const connection = await client.acquireRawConnection();
  const events = new EventEmitter().setMaxListeners(0);
  const lost = (error?: Error) => {
    if (error) log.warn({ error: String(error) }, "the connection that hears of changes is lost");
    kept.planewardHears = undefined;
    events.emit(LOST);
  };
  connection.on("error", lost);
  connection.on("end", () => lost());
  connection.on("notification", ({ payload = "" }) => {
    const [of = "", by = ""] = payload.split(" ");
    events.emit(of, by);
  });
  await connection.query(`listen ${CHANNEL}`);
  return { events, connection };
}

/**
 * Hears of changes of records until it is told to stop.
 * @param of such as 'stack:' and its id
 * @param changed is told by whom, an empty text for a job
 * @param lost when nothing more will be heard
 * @returns stops it
 */
export async function hearChanges(
  of: readonly string[],
  changed: (by: string) => void,
  lost: () => void,
): Promise<() => void> {
  kept.planewardHears ??= listen().catch((error: unknown) => {
    kept.planewardHears = undefined;
    throw error;
  });
  const { events } = await kept.planewardHears;
  for (const each of of) events.on(each, changed);
  events.once(LOST, lost);
  return () => {
    for (const each of of) events.off(each, changed);
    events.off(LOST, lost);
  };
}

/** Ends everything that waits for changes; used when the process ends. */
export async function stopHearing(): Promise<void> {
  const heard = await kept.planewardHears?.catch(() => undefined);
  kept.planewardHears = undefined;
  heard?.events.emit(LOST);
  await heard?.connection.end().catch(() => undefined);
}

import type { StandNow } from "#app/schemas/changes.ts";
import { hearChanges } from "#app/server/changes.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { standOf, watchedRecords } from "./stand-of.server.ts";

/** Whoever listens asks anew after this long, ms: a session that has ended, or a server that goes, keeps nobody. */
const LASTS = 5 * 60_000;
/** What nobody writes to for long is cut by what lies between. */
const SIGN_OF_LIFE = 25_000;
/** Changes within this time are told as one, ms. */
const GATHERED = 300;
/** One person's pages that are told at once; more than that ask now and then. */
const MOST_OF_ONE = 20;

const told = new Map<string, number>();

/**
 * Tells how things stand with records, at once and after each change, as server-sent events (WHATWG HTML, section 9.2).
 * 204, which ends the asking, for one who listens in too many places.
 * @throws 400 for what can't be watched, 404 for what is not the person's own
 */
export async function changesStream(scope: ActorScope, of: readonly string[], signal: AbortSignal): Promise<Response> {
  const records = watchedRecords(of);
  const first = await standOf(scope, records);
  const person = scope.actor.id;
  if ((told.get(person) ?? 0) >= MOST_OF_ONE) return new Response(null, { status: 204 });
  told.set(person, (told.get(person) ?? 0) + 1);
  const bytes = new TextEncoder();
  let end = () => undefined as void;
  const body = new ReadableStream<Uint8Array>({
    start: async (stream) => {
      const say = (text: string) => stream.enqueue(bytes.encode(text));
      const stand = (now: StandNow) => say(`data: ${JSON.stringify(now)}\n\n`);
      let isOwn = true;
      let gathering: NodeJS.Timeout | undefined;
      let isOver = false;
      const tell = async () => {
        gathering = undefined;
        const own = isOwn;
        isOwn = true;
        try {
          const now = await standOf(scope, records);
          if (!isOver) stand({ stand: now, own });
        } catch {
          // Gone, or not the person's own any more: asked anew, they are told so.
          end();
        }
      };
      const changed = (by: string) => {
        isOwn &&= by === person;
        gathering ??= setTimeout(() => void tell(), GATHERED);
      };
      const life = setInterval(() => say(": here\n\n"), SIGN_OF_LIFE);
      const over = setTimeout(() => end(), LASTS);
      let stop = () => undefined as void;
      end = () => {
        if (isOver) return;
        isOver = true;
        stop();
        clearInterval(life);
        clearTimeout(over);
        clearTimeout(gathering);
        const left = (told.get(person) ?? 1) - 1;
        if (left > 0) told.set(person, left);
        else told.delete(person);
        try {
          stream.close();
        } catch {
          // Whoever listened has gone, and the stream with them.
        }
      };
      signal.addEventListener("abort", end);
      stop = await hearChanges(of, changed, end).catch(() => {
        end();
        return () => undefined;
      });
      if (isOver) return stop();
      say("retry: 3000\n\n");
      stand({ stand: first, own: false });
    },
    cancel: () => end(),
  });
  return new Response(body, {
    headers: {
      "Content-Type": "text/event-stream",
      // A proxy, or the server's own compression, must not hold back what is small.
      "Cache-Control": "private, no-store, no-transform",
      "X-Accel-Buffering": "no",
    },
  });
}

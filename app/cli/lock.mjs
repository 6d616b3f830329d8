import { createHash } from "node:crypto";
import { once } from "node:events";
import { realpathSync, statSync } from "node:fs";
import { connect, createServer } from "node:net";
import { text } from "node:stream/consumers";
import { root } from "./project.mjs";

/** How often, and in which rhythm, somebody who holds a lock but does not answer is asked again. */
const attempts = 5;
const answerTime = 1_000;

/**
 * Makes this process the only one of this project that does a thing. The lock is a socket in Linux's abstract
 * namespace: the kernel gives it to one process and takes it back when that ends, however it ends, so it is never stale.
 *
 * @param {string} thing
 * @param {() => string} describe what others who want the lock are told about this process
 * @returns {Promise<string | undefined>} undefined when this process now holds the lock, else what its holder says
 */
export async function holdLock(thing, describe) {
  const folder = realpathSync(root);
  const { dev, ino } = statSync(folder);
  const key = createHash("sha256").update(`${folder}:${dev}:${ino}`).digest("hex").slice(0, 16);
  const path = `\0planeward-${thing}-${key}`;

  for (let attempt = 1; ; attempt += 1) {
    const server = createServer((socket) => socket.on("error", () => undefined).end(describe()));
    try {
      server.listen({ path });
      await once(server, "listening");
      server.unref();
      return undefined;
    } catch (error) {
      if (!(error instanceof Error && "code" in error && error.code === "EADDRINUSE")) throw error;
    }
    try {
      const socket = connect({ path });
      socket.setTimeout(answerTime, () => socket.destroy(new Error("No answer.")));
      return await text(socket);
    } catch {
      // The holder has just ended, or is too busy to answer.
      if (attempt === attempts) return "a process that does not answer";
    }
  }
}
